import { useEffect, type RefObject } from 'react';
import { zoomAt, type View } from './photo-geometry.ts';

/** Zooms where the mouse is. React listens to wheels passively, so this one is added by hand. */
export function useWheelZoom(stage: RefObject<HTMLDivElement | null>, view: View, onView: (view: View) => void): void {
  useEffect(() => {
    const element = stage.current;
    if (!element) return;
    const turn = (event: WheelEvent) => {
      // At its whole size the page scrolls on; only a deliberate turn goes closer.
      if (view.zoom === 1 && !event.ctrlKey && !event.altKey) return;
      event.preventDefault();
      const rect = element.getBoundingClientRect();
      onView(zoomAt(view, Math.exp(-event.deltaY / 300), { x: (event.clientX - rect.left) / rect.width, y: (event.clientY - rect.top) / rect.height }));
    };
    element.addEventListener('wheel', turn, { passive: false });
    return () => element.removeEventListener('wheel', turn);
  }, [stage, view, onView]);
}
