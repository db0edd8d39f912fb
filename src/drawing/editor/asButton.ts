/** SVG has no button element: a group that selects on a press says so by its role. */
export function asButton(pressed: boolean) {
  return { role: 'button', 'aria-pressed': pressed } as const;
}
