import { useState } from 'react';
import { Key } from '#src/components/key.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextBox } from '#src/components/text-box.tsx';

interface WhyProps {
  isOpen: boolean;
  onClose: () => void;
  /** What is about to be done, for example 'Strike this entry'. */
  title: string;
  /** What is asked, for example 'Why is it struck?'. */
  question: string;
  /** The word on the key that does it. */
  confirm: string;
  isDanger?: boolean;
  /** What kept it from being done, after `onConfirm`. */
  problem?: string | undefined;
  /** Called with the reason, trimmed and never empty. */
  onConfirm: (reason: string) => void;
}

/** Asks for the reason before something is done that others will want to understand. */
export function Why({ isOpen, ...rest }: WhyProps) {
  return isOpen ? <OpenWhy {...rest} /> : null;
}

function OpenWhy({
  onClose,
  title,
  question,
  confirm,
  isDanger = false,
  problem,
  onConfirm,
}: Omit<WhyProps, 'isOpen'>) {
  const [reason, setReason] = useState('');
  const [isAsked, setAsked] = useState(false);

  function confirmReason() {
    if (reason.trim() === '') return setAsked(true);
    onConfirm(reason.trim());
  }

  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={title}
      foot={
        <>
          <Key kind={isDanger ? 'danger' : 'main'} onClick={confirmReason}>
            {confirm}
          </Key>
          <Key kind="quiet" onClick={onClose}>
            Leave it as it is
          </Key>
        </>
      }
    >
      <TextBox
        label={question}
        value={reason}
        onChange={setReason}
        problem={isAsked && reason.trim() === '' ? 'Write the reason in a few words.' : problem}
      />
    </Sheet>
  );
}
