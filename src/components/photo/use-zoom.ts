import { type MouseEvent, type RefObject, useLayoutEffect, useRef, useState } from 'react';

const STEPS = [1, 1.5, 2, 3, 4];
/** How many times as large as fits the screen. */
export const ZOOM_MAX = STEPS.at(-1)!;

/** A place in a picture, as shares of its width and height. */
interface Spot {
  x: number;
  y: number;
}

const MIDDLE: Spot = { x: 0.5, y: 0.5 };

export interface Zoom {
  times: number;
  larger: () => void;
  smaller: () => void;
  whole: () => void;
  /** brings the place that was tapped to the middle, larger where all of it was to be seen */
  tap: (event: MouseEvent<HTMLElement>) => void;
}

/**
 * How large a picture is shown, and which place of it is in the middle, within the room that the ref is given to.
 * Another `pictureId` begins anew.
 */
export function useZoom(pictureId: string): [RefObject<HTMLDivElement | null>, Zoom] {
  const room = useRef<HTMLDivElement>(null);
  const [shown, setShown] = useState({ pictureId, times: 1, spot: MIDDLE });
  const { times, spot } = shown.pictureId === pictureId ? shown : { times: 1, spot: MIDDLE };

  useLayoutEffect(() => {
    const element = room.current;
    element?.scrollTo({
      left: spot.x * element.scrollWidth - element.clientWidth / 2,
      top: spot.y * element.scrollHeight - element.clientHeight / 2,
    });
  }, [times, spot]);

  const show = (next: number, at: Spot) => setShown({ pictureId, times: next, spot: at });
  const zoom = {
    times,
    larger: () => show(STEPS.find((step) => step > times) ?? times, middleOf(room.current)),
    smaller: () => show(STEPS.findLast((step) => step < times) ?? times, middleOf(room.current)),
    whole: () => show(1, MIDDLE),
    tap: (event: MouseEvent<HTMLElement>) => {
      const box = event.currentTarget.getBoundingClientRect();
      const at = { x: (event.clientX - box.left) / box.width, y: (event.clientY - box.top) / box.height };
      show(times === 1 ? 2 : times, at);
    },
  };
  return [room, zoom];
}

/** The place that is in the middle now. */
function middleOf(room: HTMLElement | null): Spot {
  if (!room || room.scrollWidth === 0) return MIDDLE;
  return {
    x: (room.scrollLeft + room.clientWidth / 2) / room.scrollWidth,
    y: (room.scrollTop + room.clientHeight / 2) / room.scrollHeight,
  };
}
