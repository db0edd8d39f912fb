/** Stands in for the optional raster and markup libraries the PDF writer never needs here. */
export default {};
