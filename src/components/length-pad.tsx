import { fractionText, inchesFromMm, mmFromInches, type Units } from '#shared/measure/length.ts';
import { keyLook } from '#src/components/key-look.ts';

interface LengthPadProps {
  /** What is measured, for a screen reader: 'Length'. */
  label: string;
  units: Units;
  /** Whole millimetres; undefined where nothing is said. */
  mm: number | undefined;
  onChange: (mm: number | undefined) => void;
}

const WHOLE_MAX = { imperial: 999, metric: 99_999 };
const FRACTIONS = [2, 4, 6, 8, 10, 12, 14];

/** A length by keys: whole inches with a fraction to the sixteenth, or millimetres. */
export function LengthPad({ label, units, mm, onChange }: LengthPadProps) {
  const { whole, sixteenths } =
    units === 'metric' ? { whole: mm ?? 0, sixteenths: 0 } : inchesFromMm(mm ?? 0);
  const take = (nextWhole: number, nextSixteenths: number) => {
    if (nextWhole > WHOLE_MAX[units]) return;
    onChange(units === 'metric' ? nextWhole : mmFromInches({ whole: nextWhole, sixteenths: nextSixteenths }));
  };
  return (
    <div role="group" aria-label={`${label}, by keys`} className="grid gap-3">
      {units === 'imperial' && (
        <div className="grid grid-cols-4 gap-3">
          {FRACTIONS.map((each) => (
            <PadKey
              key={each}
              isPressed={each === sixteenths}
              onClick={() => take(whole, each === sixteenths ? 0 : each)}
            >
              <span className="frac text-[22px]">{fractionText(each)}</span>
            </PadKey>
          ))}
          <PadKey
            isPressed={sixteenths % 2 === 1}
            onClick={() => take(whole, sixteenths % 2 === 1 ? sixteenths - 1 : sixteenths + 1)}
          >
            <span>
              and <span className="frac text-[22px]">1/16</span>
            </span>
          </PadKey>
        </div>
      )}
      <div className="grid grid-cols-4 gap-3">
        {[1, 2, 3, 4, 5, 6, 7, 8, 9, 0].map((digit) => (
          <PadKey key={digit} onClick={() => take(whole * 10 + digit, sixteenths)}>
            <span className="text-[22px]">{digit}</span>
          </PadKey>
        ))}
        <PadKey onClick={() => take(Math.floor(whole / 10), sixteenths)}>
          <span aria-hidden="true">⌫</span>
          <span className="sr-only">Last figure away</span>
        </PadKey>
        <PadKey onClick={() => onChange(undefined)}>Clear</PadKey>
      </div>
    </div>
  );
}

interface PadKeyProps {
  isPressed?: boolean;
  onClick: () => void;
  children: React.ReactNode;
}

function PadKey({ isPressed, onClick, children }: PadKeyProps) {
  return (
    <button
      type="button"
      aria-pressed={isPressed}
      className={`${keyLook('plain')} !px-1 aria-pressed:bg-bilge aria-pressed:text-primer`}
      onClick={onClick}
    >
      {children}
    </button>
  );
}
