export { BusSlip, type BusSlipProps } from './BusSlip.tsx';
export { Formula } from './Formula.tsx';
export { PartSlip, type PartSlipProps } from './PartSlip.tsx';
export { QuantityInput, type QuantityInputProps } from './QuantityInput.tsx';
export { SlipField, type SlipFieldProps } from './SlipField.tsx';
export { refusalOf } from './SlipScope.ts';
