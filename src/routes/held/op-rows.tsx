import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { type Bung, BungMark } from '#src/components/bung-mark.tsx';
import { Thumb } from '#src/components/photo/thumb.tsx';
import { PlainPlank } from '#src/components/plank.tsx';
import type { HeldLine, HeldPhotoLine, SentLine, SetAsideLine } from '#src/routes/held/read-held.ts';
import type { OpInWords } from '#src/words/op-words.ts';

/** Something held: what it is, where, since when, how old. */
export function HeldRow({ line }: { line: HeldLine }) {
  return (
    <OpRow line={line} mark="held">
      Made {line.made}, {line.age} ago{line.whose && `, by ${line.whose}`}
    </OpRow>
  );
}

/** A picture on its way: where it is of, since when, how far it has come. */
export function HeldPhotoRow({ line }: { line: HeldPhotoLine }) {
  return (
    <PlainPlank>
      <div className="relative flex items-start gap-3">
        <BungMark mark={line.isRefused ? 'loose' : 'held'} word="" />
        <div className="w-[148px] shrink-0">
          <Thumb sha256={line.sha256} words={`Photo, ${line.where}`} />
        </div>
        <div className="min-w-0">
          <p className="font-semibold break-words">{line.where}</p>
          <p>{line.became}</p>
          <p className="text-slate">Taken in {line.made}</p>
        </div>
      </div>
    </PlainPlank>
  );
}

/** Something that the server set aside: why, and what has become of it. */
export function SetAsideRow({ line }: { line: SetAsideLine }) {
  return (
    <OpRow line={line} mark={line.isWaiting ? 'loose' : 'sent'}>
      {line.isWaiting && `${line.reason} `}
      <span className="font-semibold text-bilge">{line.state}</span>
    </OpRow>
  );
}

/** Something sent, with what the server made of it. */
export function SentRow({ line }: { line: SentLine }) {
  return (
    <OpRow line={line} mark={line.isLoose ? 'loose' : 'sent'}>
      {line.became}
    </OpRow>
  );
}

function OpRow({ line, mark, children }: { line: OpInWords; mark: Bung; children: ReactNode }) {
  return (
    <PlainPlank>
      <div className="relative flex items-start gap-3">
        <BungMark mark={mark} word="" />
        <div className="min-w-0">
          <p>
            <span className="font-semibold">{line.what}</span>
            {line.where && ` · ${line.where}`}
          </p>
          {line.words && <p className="break-words">{line.words}</p>}
          <p className="text-slate">{children}</p>
          {line.entryId && (
            <Link
              to={`/entry/${line.entryId}`}
              className="flex min-h-key items-center text-verdigris underline decoration-2 underline-offset-4"
            >
              Open the entry
            </Link>
          )}
        </div>
      </div>
    </PlainPlank>
  );
}
