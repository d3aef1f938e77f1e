import type { ReactNode } from 'react';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextBox } from '#src/components/text-box.tsx';

interface AmendSheetProps {
  title: string;
  onClose: () => void;
  why: string;
  onWhy: (why: string) => void;
  /** That no reason was given where one is asked for. */
  whyProblem?: string | undefined;
  whyLabel?: string;
  onConfirm: () => void;
  /** What kept it from being held. */
  failure: string | undefined;
  children: ReactNode;
}

/** A change of an entry: what is to be, and why. */
export function AmendSheet(props: AmendSheetProps) {
  return (
    <Sheet
      isOpen
      onClose={props.onClose}
      title={props.title}
      foot={
        <>
          {props.failure !== undefined && <Notice tone="error">{props.failure}</Notice>}
          <Key kind="main" onClick={props.onConfirm}>
            Change it
          </Key>
        </>
      }
    >
      {props.children}
      <TextBox
        label={props.whyLabel ?? 'Why? (if it needs telling)'}
        rows={1}
        value={props.why}
        onChange={props.onWhy}
        problem={props.whyProblem}
      />
    </Sheet>
  );
}
