export { BusSlip, type BusSlipProps } from './BusSlip.tsx';
export { PartSlip, type PartSlipProps } from './PartSlip.tsx';
export { QuantityInput, type QuantityInputProps } from './QuantityInput.tsx';
