import { useCallback, useEffect, useRef, useState, type PointerEvent, type RefObject } from 'react';
import type { DayStripsHandle } from '#src/strips/DayStrips.tsx';
import type { DropTarget } from '#src/strips/dropAt.ts';

export type DragTarget = DropTarget | 'notPlaced' | null;

export interface VisitDrag {
  /** The visit in hand and where it would land; null while nothing is dragged. */
  dragging: { visitId: string; target: DragTarget } | null;
  /** The ghost follows the pointer by this element's style: no render per pixel. */
  ghost: RefObject<HTMLDivElement | null>;
  start: (visitId: string, event: PointerEvent) => void;
  /** True once after a drag: the click that ends it opens nothing. */
  endedJustNow: () => boolean;
}

/**
 * Dragging a visit with pointer events. A mouse drags after 5 px; a finger after resting 350 ms, so
 * that swiping still scrolls. Escape lets go.
 */
export function useVisitDrag(
  strips: RefObject<DayStripsHandle | null>,
  onDrop: (visitId: string, target: Exclude<DragTarget, null>) => void,
): VisitDrag {
  const [dragging, setDragging] = useState<VisitDrag['dragging']>(null);
  const ghost = useRef<HTMLDivElement>(null);
  const endedAt = useRef(-Infinity);
  const stop = useRef<(() => void) | null>(null);
  useEffect(() => () => stop.current?.(), []);

  const start = useCallback(
    (visitId: string, event: PointerEvent) => {
      if (event.button !== 0 || stop.current) return;
      const { clientX: fromX, clientY: fromY, pointerId, pointerType } = event;
      let active = false;
      let target: DragTarget = null;
      let last = { x: fromX, y: fromY };
      const begin = () => {
        active = true;
        document.body.style.cursor = 'grabbing';
        look();
      };
      const wait = pointerType === 'touch' ? setTimeout(begin, TOUCH_REST_MS) : undefined;
      const look = () => {
        const next = targetUnder(strips.current, last.x, last.y, visitId);
        if (!same(next, target) || !ghost.current) {
          target = next;
          setDragging({ visitId, target });
        }
        if (ghost.current) placeGhost(ghost.current, last.x, last.y);
      };
      const move = (moved: globalThis.PointerEvent) => {
        if (moved.pointerId !== pointerId) return;
        last = { x: moved.clientX, y: moved.clientY };
        const far = Math.hypot(last.x - fromX, last.y - fromY);
        if (!active && pointerType !== 'touch' && far > 5) begin();
        else if (!active && far > 10) end(false);
        else if (active) {
          look();
          scrollNearEdge(last.y);
        }
      };
      const up = (released: globalThis.PointerEvent) => {
        if (released.pointerId === pointerId) end(released.type === 'pointerup');
      };
      const key = (pressed: KeyboardEvent) => {
        if (pressed.key !== 'Escape' || !active) return;
        pressed.stopPropagation();
        end(false);
      };
      const hold = (touch: TouchEvent) => {
        if (active) touch.preventDefault();
      };
      // A finger that rests would otherwise open the browser's own menu over the visit in hand.
      const menu = (asked: Event) => {
        if (pointerType === 'touch') asked.preventDefault();
      };
      const end = (dropped: boolean) => {
        clearTimeout(wait);
        window.removeEventListener('pointermove', move);
        window.removeEventListener('pointerup', up);
        window.removeEventListener('pointercancel', up);
        window.removeEventListener('keydown', key, true);
        window.removeEventListener('touchmove', hold);
        window.removeEventListener('contextmenu', menu);
        document.body.style.cursor = '';
        stop.current = null;
        if (active) endedAt.current = performance.now();
        setDragging(null);
        if (active && dropped && target) onDrop(visitId, target);
      };
      stop.current = () => end(false);
      window.addEventListener('pointermove', move);
      window.addEventListener('pointerup', up);
      window.addEventListener('pointercancel', up);
      window.addEventListener('keydown', key, true);
      window.addEventListener('touchmove', hold, { passive: false });
      window.addEventListener('contextmenu', menu);
    },
    [strips, onDrop],
  );
  const endedJustNow = useCallback(() => performance.now() - endedAt.current < 80, []);
  return { dragging, ghost, start, endedJustNow };
}

/** Beside the pointer, and whole within the window. */
function placeGhost(ghost: HTMLElement, x: number, y: number): void {
  const left = Math.min(x + 14, window.innerWidth - ghost.offsetWidth - 8);
  const top = Math.min(y + 14, window.innerHeight - ghost.offsetHeight - 8);
  ghost.style.transform = `translate(${Math.max(8, left)}px, ${Math.max(8, top)}px)`;
}

function targetUnder(
  strips: DayStripsHandle | null,
  x: number,
  y: number,
  visitId: string,
): DragTarget {
  const element = document.elementFromPoint(x, y);
  if (element?.closest('[data-drop="notPlaced"]')) return 'notPlaced';
  return strips?.targetAt(x, y, visitId) ?? null;
}

function same(one: DragTarget, other: DragTarget): boolean {
  if (one === null || other === null || typeof one === 'string' || typeof other === 'string')
    return one === other;
  return one.vanId === other.vanId && one.index === other.index;
}

function scrollNearEdge(y: number): void {
  if (y < 56) window.scrollBy(0, -14);
  else if (y > window.innerHeight - 56) window.scrollBy(0, 14);
}

const TOUCH_REST_MS = 350;
