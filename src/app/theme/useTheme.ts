import { useEffect } from 'react';
import { phaseInk } from '../../charts/index.ts';
import { useWorkbench } from '../../store/index.ts';
import { phaseColoursOf } from '../../study/index.ts';

/** Puts the chosen theme and the study's phase colours on the page; "system" follows the machine's. */
export function useTheme(): void {
  const theme = useWorkbench((state) => state.view.theme);
  const colours = useWorkbench((state) => phaseColoursOf(state.study));
  useEffect(() => {
    const dark = window.matchMedia('(prefers-color-scheme: dark)');
    const apply = () => {
      const shown = theme === 'system' ? (dark.matches ? 'dark' : 'light') : theme;
      const { dataset, style } = document.documentElement;
      dataset.theme = shown;
      phaseInk(colours, shown).forEach((ink, phase) => {
        style.setProperty(`--l${phase + 1}`, ink);
      });
    };
    apply();
    dark.addEventListener('change', apply);
    return () => dark.removeEventListener('change', apply);
  }, [theme, colours]);
}
