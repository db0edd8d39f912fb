/** The measures of the drawing at 100 %, in px. Storeys, slots and labels are built from these alone. */

export const FONT_PX = 12;
export const LINE_PX = 13;
/** Baseline of a line of text below the top of its line. */
export const BASELINE = 11;

/** Busbar to the top of a hanging symbol: room for the verdict's mark and word beside the conductor. */
export const LEAD = 34;
/** Centre of a hanging symbol below its busbar, or below the top of its row. */
export const SYMBOL_DEPTH = LEAD + 24;
/** Top of a hanging part's text below its busbar, or below the top of its row. */
export const LEAF_TEXT_DEPTH = LEAD + 52;
/** Top of the text beside a part that leads on, below its busbar. */
export const SIDE_TEXT_DEPTH = 9;
/** Least depth of a row with a symbol that leads on. */
export const TRUNK_DEPTH = SYMBOL_DEPTH + 36;
/** Between the foot of a row's text and what stands below. */
export const ROW_GAP = 8;
/** Depth of a storey with nothing below its busbars. */
export const BARE_DEPTH = 26;
/** Top of what stands under a tie, below its busbars. */
export const TIE_TEXT_DEPTH = 24;
/** A tie's verdict and letters, above its text. */
export const TIE_MARK_HEIGHT = 17;

/** Above a busbar: its name and volts beside the dial. */
export const PLATE_HEIGHT = 32;
export const PLATE_LIFT = 5;
/** Between the foot of a storey and the next storey's busbars, without lanes. */
export const STOREY_BAND = PLATE_HEIGHT + PLATE_LIFT + 7;
export const LANE_PITCH = 12;

export const DIAL_RADIUS = 15;
export const DIAL_ROOM = 2 * DIAL_RADIUS + 6;
/** Width kept for the live volts beside the nominal voltage. */
export const BUS_READING = 116;
export const BUS_NAME_LIMIT = 168;
/** Mark, word and a letter right of a busbar's name. */
export const BUS_MARK_ROOM = 46;
export const BUS_LETTERS = 22;

/** Live readings: a number that ends, and a unit that begins, at a fixed place. */
export const VALUE_WIDTH = 34;
export const UNIT_WIDTH = 36;
export const UNIT_GAP = 3;
export const CELL_WIDTH = VALUE_WIDTH + UNIT_GAP + UNIT_WIDTH;
/** Under a hanging part a cell stands so far right of its middle: most units are short. */
export const CELL_SHIFT = 4;
/** Between the two columns of readings beside a part that leads on. */
export const CELL_GAP = 2;

/** Text under a hanging part: at least a cell wide, at most so wide. */
export const LEAF_LIMIT = 100;
/** Text beside a part that leads on or feeds. */
export const SIDE_LIMIT = 152;
/** Reach of a hanging part's text and mark to each side at least. */
export const MARK_RIGHT = 40;
export const MARK_WIDTH = 32;
export const MARK_HEIGHT = 29;
/** Between a conductor and the mark or the letters beside it. */
export const MARK_OFFSET = 8;
/** Left of a part that leads on: its mark and letters. */
export const SIDE_LEFT = MARK_OFFSET + MARK_WIDTH + 2;
/** A source is wider than its conductor: its mark stands so much further left. */
export const SOURCE_HALF = 8;
export const SIDE_TEXT_OFFSET = 22;

export const SLOT_GAP = 6;
export const BUS_GAP = 26;
export const ISLAND_GAP = 48;
/** From the outermost conductor to the end of the bar. */
export const BAR_INSET = 14;
/** Between a busbar's plate and a conductor that meets the bar. */
export const PLATE_CLEAR = 18;
export const ARRIVAL_PITCH = 18;
/** Half the width kept for a conductor that passes a row. */
export const PASS_HALF = 5;
export const MARGIN = 14;
