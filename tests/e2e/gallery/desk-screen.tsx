import { Badge } from '#src/components/badge.tsx';
import { BUNG_WORDS, type Bung, BungMark } from '#src/components/bung-mark.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Icon, type IconName } from '#src/components/icons.tsx';
import { Key } from '#src/components/key.tsx';
import { KeyRow, Page, Section } from '#src/components/page.tsx';
import { PlainPlank } from '#src/components/plank.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { TopBar } from '#src/components/top-bar.tsx';

const PLACES = [
  { to: '/desk', label: 'Day sheet', count: 2 },
  { to: '/line', label: 'Alongside' },
  { to: '/form', label: 'People' },
];
const MARKS: readonly Bung[] = ['held', 'sent', 'released', 'loose', 'struck'];
const ICONS: readonly IconName[] = [
  'entry',
  'tick',
  'hours',
  'boat',
  'list',
  'phone',
  'plus',
  'minus',
  'back',
  'undo',
  'people',
  'warning',
  'photo',
  'close',
];

/** A desk screen: the bar of places, rows off the line, and every mark and icon by name. */
export function DeskScreen() {
  return (
    <Page width="wide" bars={<TopBar places={PLACES} right="Orrin · all sent 16:42" />}>
      <Section
        title="Tuesday 5 May"
        level={1}
        aside={
          <KeyRow>
            <Key icon="back">Mon 4 May</Key>
            <Key>Another day</Key>
          </KeyRow>
        }
      >
        <Planks>
          <PlainPlank>
            <b>Rosa</b> <span className="text-slate">sent 12:05</span>{' '}
            <span className="font-semibold text-mahogany">Juniper Tide</span> Made a pattern for the stringer
            piece. <Hours minutes={390} />{' '}
            <a className="text-verdigris underline" href="#/line">
              her day
            </a>
          </PlainPlank>
          <PlainPlank>
            <b>Wes</b> Starboard sole panels up. <Hours minutes={140} />, <Hours minutes={45} />,{' '}
            <Hours minutes={480} />
          </PlainPlank>
        </Planks>
      </Section>
      <Section
        title={
          <>
            Loose ends <Badge count={12} what="loose ends" />
          </>
        }
      >
        <Planks>
          {MARKS.map((mark) => (
            <PlainPlank key={mark}>
              <span className="flex items-center gap-4">
                <BungMark mark={mark} word="" />
                <BungMark mark={mark} size={56} />
                {BUNG_WORDS[mark]}
              </span>
            </PlainPlank>
          ))}
        </Planks>
      </Section>
      <Section title="Icons">
        <div className="flex flex-wrap gap-6 px-4 md:px-6">
          {ICONS.map((name) => (
            <span key={name} className="grid justify-items-center gap-1">
              <Icon name={name} size={32} />
              {name}
            </span>
          ))}
        </div>
      </Section>
    </Page>
  );
}
