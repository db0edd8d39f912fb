import { type ComponentProps, startTransition, useEffect, useRef, useState } from 'react';
import { PagePreview } from './PagePreview.tsx';

/** The id of a page in the preview. */
export const leafId = (page: number): string => `sheet-page-${page}`;

/** A page that is drawn once it comes near the window, so that a long sheet opens at once. */
export function LazyPage({ count, ...props }: ComponentProps<typeof PagePreview> & { count: number }) {
  const holder = useRef<HTMLElement>(null);
  const [near, setNear] = useState(props.page.number === 1);
  useEffect(() => {
    const element = holder.current;
    if (!element || near) return;
    const observer = new IntersectionObserver(
      (entries) => {
        if (entries.some(({ isIntersecting }) => isIntersecting)) startTransition(() => setNear(true));
      },
      { rootMargin: '400px' },
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [near]);
  return (
    <section
      ref={holder}
      id={leafId(props.page.number)}
      className="sheet-leaf"
      style={{ aspectRatio: `${props.page.width} / ${props.page.height}` }}
      aria-label={`Page ${props.page.number} of ${count}`}
    >
      {near && <PagePreview {...props} />}
    </section>
  );
}
