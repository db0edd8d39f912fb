import { type ComponentProps, useEffect, useRef, useState } from 'react';
import { PagePreview } from './PagePreview.tsx';

/** A page that is drawn once it comes near the window, so that a long sheet opens at once. */
export function LazyPage({ count, ...props }: ComponentProps<typeof PagePreview> & { count: number }) {
  const holder = useRef<HTMLElement>(null);
  const [near, setNear] = useState(props.page.number === 1);
  useEffect(() => {
    const element = holder.current;
    if (!element || near) return;
    const observer = new IntersectionObserver(
      (entries) => {
        if (entries.some(({ isIntersecting }) => isIntersecting)) setNear(true);
      },
      { rootMargin: '800px' },
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [near]);
  return (
    <section
      ref={holder}
      className="sheet-leaf"
      style={{ aspectRatio: `${props.page.width} / ${props.page.height}` }}
      aria-label={`Page ${props.page.number} of ${count}`}
    >
      {near && <PagePreview {...props} />}
    </section>
  );
}
