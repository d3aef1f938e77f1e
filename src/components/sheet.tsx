import { type ReactNode, useId, useLayoutEffect, useRef, useState } from 'react';
import { IconKey } from '#src/components/key.tsx';

interface SheetProps {
  isOpen: boolean;
  /** Called for Esc, for the close key and for a tap outside. */
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** Keys that stay in sight at the foot. */
  foot?: ReactNode;
}

/** A sheet from the foot of a phone, a dialog on a desk. The browser's own dialog keeps the focus and answers Esc. */
export function Sheet({ isOpen, ...rest }: SheetProps) {
  return isOpen ? <OpenSheet {...rest} /> : null;
}

function OpenSheet({ onClose, title, children, foot }: Omit<SheetProps, 'isOpen'>) {
  const dialog = useRef<HTMLDialogElement>(null);
  const content = useRef<HTMLDivElement>(null);
  const titleId = useId();
  const [isLongText, setLongText] = useState(false);
  // closed before it leaves the page, or the focus does not go back to the key that opened it
  useLayoutEffect(() => {
    const element = dialog.current;
    element?.showModal();
    setLongText(content.current !== null && isTextBeyond(content.current));
    return () => element?.close();
  }, []);
  return (
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      className="fixed inset-x-0 [--focus:var(--bilge)] top-auto bottom-0 m-0 hidden max-h-[88dvh] w-full max-w-none flex-col border-t-[3px] border-bilge bg-primer p-0 text-bilge backdrop:bg-[#000a] open:flex md:inset-0 md:m-auto md:h-fit md:w-[560px] md:rounded-key md:border-[3px]"
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        if (event.target === event.currentTarget) onClose();
      }}
    >
      <div className="flex items-center justify-between gap-3 border-b-2 border-line py-2 pr-2 pl-4">
        <h2 id={titleId} className="text-[22px] leading-tight font-bold">
          {title}
        </h2>
        <IconKey icon="close" word="Close" kind="quiet" isBare onClick={onClose} />
      </div>
      <div ref={content} className="grid gap-4 overflow-y-auto p-4" {...(isLongText ? { tabIndex: 0 } : {})}>
        {children}
      </div>
      {foot !== undefined && (
        <div className="grid gap-3 border-t-2 border-line p-4 pb-[calc(16px+env(safe-area-inset-bottom))]">
          {foot}
        </div>
      )}
    </dialog>
  );
}

/** Longer than the sheet and with nothing in it to go to by Tab: the keyboard has to scroll it. */
function isTextBeyond(content: Element): boolean {
  return (
    content.scrollHeight > content.clientHeight &&
    content.querySelector('a, button, input, select, textarea, summary') === null
  );
}
