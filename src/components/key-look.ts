export type KeyKind = 'main' | 'plain' | 'quiet' | 'danger' | 'onDeep';
export type KeySize = 'plain' | 'great' | 'stacked' | 'bare';

const KINDS: Record<KeyKind, string> = {
  main: 'border-2 border-verdigris bg-verdigris text-on-verdigris font-bold',
  plain: 'border-2 border-bilge bg-plank text-bilge font-semibold',
  quiet: 'border-2 border-transparent text-verdigris font-semibold underline decoration-2 underline-offset-4',
  danger: 'border-[3px] border-redlead bg-plank text-redlead font-bold',
  // on a bar of dark ground
  onDeep: 'border-2 border-current text-inherit font-semibold',
};

const SIZES: Record<KeySize, string> = {
  plain: 'min-h-key gap-2 px-4 py-2 text-[18px]',
  great: 'min-h-[76px] gap-3 px-4 py-2 text-[23px]',
  stacked: 'min-h-[68px] flex-col gap-1 px-1 py-2 text-[18px]',
  bare: 'size-key shrink-0',
};

const DISABLED =
  'disabled:border-2 disabled:border-dashed disabled:border-slate disabled:bg-transparent disabled:text-slate disabled:no-underline';

/** The classes of a key: 56 px high at least, nearly square corners. */
export function keyLook(kind: KeyKind, size: KeySize = 'plain'): string {
  return `flex items-center justify-center rounded-key text-center leading-tight active:translate-y-px ${DISABLED} ${SIZES[size]} ${KINDS[kind]}`;
}
