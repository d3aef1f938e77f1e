/* What is measured of a screen. Each function runs inside the page, so it holds all that it needs. */

export interface Limits {
  textMinPx: number;
  targetMinPx: number;
  /** 0 where targets may touch. */
  gapMinPx: number;
}

export const CREW_LIMITS: Limits = { textMinPx: 18, targetMinPx: 56, gapMinPx: 12 };
export const DESK_LIMITS: Limits = { textMinPx: 16, targetMinPx: 44, gapMinPx: 0 };

/** Words that are set smaller than `textMinPx`, with their size. */
export function smallWords(textMinPx: number): string[] {
  const small: string[] = [];
  const walker = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT);
  for (let node = walker.nextNode(); node; node = walker.nextNode()) {
    const words = node.textContent?.trim();
    const element = node.parentElement!;
    if (!words || element.closest('svg, title') || !element.checkVisibility()) continue;
    const { width } = element.getBoundingClientRect();
    const size = Number.parseFloat(getComputedStyle(element).fontSize);
    // what is there for a screen reader alone is a pixel wide
    if (width > 1 && size < textMinPx) small.push(`${words}: ${size} px`);
  }
  for (const field of document.querySelectorAll('input, select, textarea')) {
    const size = Number.parseFloat(getComputedStyle(field).fontSize);
    if (field.getBoundingClientRect().width > 1 && size < textMinPx) small.push(`${field.id}: ${size} px`);
  }
  return small;
}

/** Targets that are too small, and pairs that are too near. A link in running text needs 24 px, as does a cell's width. */
export function targetFaults({ targetMinPx, gapMinPx }: Limits): string[] {
  const INLINE_MIN_PX = 24;
  const SLACK_PX = 0.1;
  interface Target {
    name: string;
    left: number;
    top: number;
    right: number;
    bottom: number;
    isInline: boolean;
    /** in a table, as wide as its column */
    isInCell: boolean;
    /** a bar or a plank, which are laid edge to edge */
    isRow: boolean;
  }
  const scope = document.querySelector('dialog[open]') ?? document.body;
  const reach =
    'button:not(:disabled), a[href], select, textarea, summary, input:not(.sr-only), label:has(input.sr-only)';

  /** The box that answers to a finger: the element's, or that of the pseudo-element it lays over its row. */
  function boxOf(element: Element): { box: DOMRect; isOverRow: boolean } {
    const after = getComputedStyle(element, '::after');
    const box = element.getBoundingClientRect();
    if (after.content === 'none' || after.position !== 'absolute') return { box, isOverRow: false };
    let around = element.parentElement!;
    while (getComputedStyle(around).position === 'static') around = around.parentElement!;
    const [left, top, width, height] = [after.left, after.top, after.width, after.height].map(
      Number.parseFloat,
    );
    const outer = around.getBoundingClientRect();
    return { box: new DOMRect(outer.left + left!, outer.top + top!, width!, height!), isOverRow: true };
  }

  // a key has a border of its own, a plank has none
  function isPlank(element: Element, box: DOMRect): boolean {
    const list = element.closest('ul');
    if (list === null || getComputedStyle(element).borderTopWidth !== '0px') return false;
    return box.width > 0.8 * list.getBoundingClientRect().width;
  }

  function targetOf(element: Element): Target {
    const { box, isOverRow } = boxOf(element);
    const isRunning = getComputedStyle(element).display === 'inline' && element.matches('a, button');
    const ownWords = element.textContent?.trim() ?? '';
    const name = element.getAttribute('aria-label') ?? (ownWords || element.id);
    return {
      name: name.slice(0, 60),
      left: box.left,
      top: box.top + scrollY,
      right: box.right,
      bottom: box.bottom + scrollY,
      isInline: isRunning && !isOverRow,
      isInCell: element.closest('td, th[scope=col]') !== null,
      isRow: isOverRow || element.hasAttribute('data-bar') || isPlank(element, box),
    };
  }

  const targets = [...scope.querySelectorAll(reach)]
    .filter((element) => element.checkVisibility() && element.getBoundingClientRect().width > 1)
    .map(targetOf);
  const small = targets
    .map(({ name, isInline, isInCell, left, right, top, bottom }) => {
      const least = isInline ? INLINE_MIN_PX : targetMinPx;
      const isNarrow = right - left < (isInCell ? INLINE_MIN_PX : least) - SLACK_PX && !isInline;
      const isLow = bottom - top < least - SLACK_PX;
      const size = `${Math.round(right - left)} x ${Math.round(bottom - top)} px`;
      return isNarrow || isLow ? `${name}: ${size}` : null;
    })
    .filter((fault) => fault !== null);
  const near = targets.flatMap((a, index) =>
    targets.slice(index + 1).flatMap((b) => {
      if (a.isRow || b.isRow || a.isInline || b.isInline) return [];
      const across = Math.max(a.left - b.right, b.left - a.right);
      const down = Math.max(a.top - b.bottom, b.top - a.bottom);
      const gap = Math.max(across, down);
      return gap < gapMinPx - SLACK_PX ? [`${a.name} and ${b.name}: ${Math.round(gap)} px apart`] : [];
    }),
  );
  return [...small, ...near];
}

/** Lets keys at the foot stand where the page or the sheet ends: floating over it they say nothing about distances. */
export function landKeys(): void {
  for (const rack of document.querySelectorAll<HTMLElement>('[data-keys]')) rack.style.position = 'static';
  const sheet = document.querySelector<HTMLElement>('dialog[open]');
  if (sheet) sheet.style.maxHeight = 'none';
}

/** What stands out beyond the window to the right. */
export function overflow(): string[] {
  const { scrollWidth, clientWidth } = document.documentElement;
  if (scrollWidth <= clientWidth) return [];
  const beyond = [...document.body.querySelectorAll('*')].filter(
    (element) => element.getBoundingClientRect().right > clientWidth + 1,
  );
  const named = beyond
    .filter((element) => !beyond.some((other) => other !== element && element.contains(other)))
    .slice(0, 5)
    .map((element) => `${element.tagName} ${element.textContent?.trim().slice(0, 40)}`);
  return [`${scrollWidth} px in ${clientWidth} px: ${named.join(', ')}`];
}

/** Sets all type at twice its size, as a person does who reads with difficulty. */
export function doubleText(): void {
  const elements = [...document.body.querySelectorAll<HTMLElement>('*')];
  const sizes = elements.map((element) => Number.parseFloat(getComputedStyle(element).fontSize));
  elements.forEach((element, index) => {
    element.style.fontSize = `${sizes[index]! * 2}px`;
  });
}

/** Marks what Tab is to reach, in the document's order, and says how many stops there are. */
export function markStops(): number {
  const reach =
    'a[href], button:not(:disabled), input:not(:disabled), select:not(:disabled), textarea, summary';
  const stops = new Set<string>();
  let count = 0;
  for (const element of document.querySelectorAll<HTMLElement>(reach)) {
    const isChosenAway = element.tabIndex < 0 || !element.checkVisibility();
    if (isChosenAway) continue;
    // a group of radio keys is one stop
    const group = element instanceof HTMLInputElement && element.type === 'radio' ? element.name : null;
    if (group !== null && stops.has(group)) {
      element.dataset['stop'] = String(count);
      continue;
    }
    if (group !== null) stops.add(group);
    count += 1;
    element.dataset['stop'] = String(count);
  }
  return count;
}

export interface Stop {
  /** By `markStops`, from 1; 0 where the focus is on nothing of the page. */
  at: number;
  name: string;
  isSeen: boolean;
}

/** Where the focus is, and whether an outline shows it: the element's own, its key's, or that over its row. */
export function focusedStop(): Stop {
  const element = document.activeElement as HTMLElement | null;
  const at = Number(element?.dataset['stop'] ?? 0);
  if (!element || at === 0) return { at: 0, name: element?.tagName ?? '', isSeen: false };
  const outlines = [
    getComputedStyle(element),
    getComputedStyle(element, '::after'),
    ...(element.closest('label') ? [getComputedStyle(element.closest('label')!)] : []),
  ];
  const isSeen = outlines.some(
    ({ outlineStyle, outlineWidth }) => outlineStyle !== 'none' && Number.parseFloat(outlineWidth) >= 2,
  );
  const name = element.getAttribute('aria-label') ?? element.textContent?.trim().slice(0, 40) ?? '';
  return { at, name, isSeen };
}
