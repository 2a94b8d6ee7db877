import { useCallback, useRef, useState, type FocusEvent, type PointerEvent } from 'react';
import type { TipPlace } from './StripTip.tsx';
import type { Strip, Tower } from './types.ts';

/** What the pointer or the focus rests on; the handlers go on the box around the drawing. */
export function useStripTip(
  strips: readonly Strip[],
  onHighlight: (stopId: string | null) => void,
) {
  const [tip, setTip] = useState<TipPlace | null>(null);
  const point = useCallback(
    (target: EventTarget | null) => {
      const element = (target as Element | null)?.closest?.<SVGGElement>('[data-stop]');
      const stop =
        element &&
        strips.flatMap((strip) => strip.stops).find((one) => one.stopId === element.dataset.stop);
      if (!element || !stop) {
        setTip(null);
        onHighlight(null);
        return;
      }
      const tower = (target as Element).closest<SVGGElement>('[data-tower]');
      const box = (tower ?? element).getBoundingClientRect();
      setTip({
        stop,
        tower: tower ? drawnTower(stop.towers, tower) : null,
        x: (box.left + box.right) / 2,
        top: box.top,
        bottom: box.bottom,
      });
      onHighlight(stop.stopId);
    },
    [strips, onHighlight],
  );
  // After a press the strips move under a still pointer; words wait until it moves itself.
  const quiet = useRef(false);
  const handlers = {
    onPointerOver: (event: PointerEvent) => {
      if (event.pointerType !== 'touch' && event.buttons === 0 && !quiet.current)
        point(event.target);
    },
    onPointerMove: (event: PointerEvent) => {
      if (!quiet.current || event.buttons !== 0) return;
      if (event.movementX === 0 && event.movementY === 0) return;
      quiet.current = false;
      if (event.pointerType !== 'touch') point(event.target);
    },
    onPointerLeave: () => point(null),
    onPointerDownCapture: () => {
      quiet.current = true;
      setTip(null);
    },
    onFocus: (event: FocusEvent) => {
      if ((event.target as Element).matches(':focus-visible')) point(event.target);
    },
    onBlur: () => point(null),
  };
  return { tip, handlers };
}

/** A drawn tower may be several steps joined: all from its first one on. */
function drawnTower(towers: readonly Tower[], element: SVGGElement): Tower | null {
  const first = towers.findIndex((tower) => tower.key === element.dataset.tower);
  const parts = towers.slice(first, first + Number(element.dataset.steps ?? 1));
  const head = parts[0];
  if (first < 0 || !head) return null;
  return {
    ...head,
    toSeconds: parts.at(-1)!.toSeconds,
    steps: parts.flatMap((part) => part.steps),
  };
}
