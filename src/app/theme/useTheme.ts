import { useEffect } from 'react';
import { useWorkbench } from '../../store/index.ts';

/** Puts the chosen theme on the page; "system" follows the machine's. */
export function useTheme(): void {
  const theme = useWorkbench((state) => state.view.theme);
  useEffect(() => {
    const dark = window.matchMedia('(prefers-color-scheme: dark)');
    const apply = () => {
      document.documentElement.dataset.theme = theme === 'system' ? (dark.matches ? 'dark' : 'light') : theme;
    };
    apply();
    dark.addEventListener('change', apply);
    return () => dark.removeEventListener('change', apply);
  }, [theme]);
}
