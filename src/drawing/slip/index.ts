export { BusSlip, type BusSlipProps } from './BusSlip.tsx';
export { FindingLine } from './FieldRow.tsx';
export { Formula } from './Formula.tsx';
export { OriginField } from './OriginField.tsx';
export { originLetters, withOriginWord } from './OriginMark.tsx';
export { PartSlip, type PartSlipProps } from './PartSlip.tsx';
export { QuantityInput, type QuantityInputProps } from './QuantityInput.tsx';
export { SlipField, type SlipFieldProps } from './SlipField.tsx';
export { refusalOf, variantCase } from './SlipScope.ts';
