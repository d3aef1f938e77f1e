import { useState } from 'react';
import { NameBar, StateBar } from '#src/components/bars.tsx';
import { DayHead } from '#src/components/day-head.tsx';
import { DayTicks } from '#src/components/day-ticks.tsx';
import { Hours } from '#src/components/hours.tsx';
import { IconKey, Key, KeyLink } from '#src/components/key.tsx';
import { KeyRack, KeyRow, Page } from '#src/components/page.tsx';
import { Plank } from '#src/components/plank.tsx';
import { Planks, Ribband } from '#src/components/ribband.tsx';
import { Undo } from '#src/components/undo.tsx';

const WEEKEND = [{ isWeekStart: false }, { isWeekStart: false }];
const FORTNIGHT = Array.from({ length: 13 }, (_, index) => ({ isWeekStart: index % 7 === 4 }));

/** A crew screen: every mark of the line, a short gap and a long one, keys at the foot. */
export function LineScreen() {
  const [isUndone, setUndone] = useState(false);
  return (
    <Page
      bars={
        <>
          <NameBar
            title="Marigold Sands"
            subTitle="Varnish · deck"
            right={
              <KeyLink to="/form" kind="onDeep">
                Other boat
              </KeyLink>
            }
          />
          <StateBar tone="held" left="3 held on this phone" right="last heard 07:40" to="/form" />
        </>
      }
      foot={
        <KeyRack>
          {!isUndone && (
            <Undo
              words="Struck: flatted the bloom"
              onUndo={() => setUndone(true)}
              onGone={() => setUndone(true)}
            />
          )}
          <Key kind="main" icon="entry" isGreat>
            Write what you did
          </Key>
          <KeyRow>
            <IconKey icon="photo" word="Photo" />
            <IconKey icon="tick" word="Tick off" />
            <IconKey icon="hours" word="Hours" />
          </KeyRow>
        </KeyRack>
      }
    >
      <Ribband label="Marigold Sands, day by day">
        <DayHead
          dayOfStay={63}
          date="Mon 31 Aug"
          note={
            <>
              today, <Hours minutes={240} />
            </>
          }
        />
        <Planks>
          <Plank mark="held" time="14:00">
            <b>Coat seven on</b>, 60 percent, a quart and a quarter.
            <p className="text-slate">
              <Hours minutes={150} /> · stands until Tue 08:00
            </p>
          </Plank>
          <Plank mark="sent" time="12:30">
            Flatted the bloom off the foredeck, and then all of the covering boards back to the second beam.
            <p className="text-slate">
              <Hours minutes={75} /> · own fault, not charged
            </p>
          </Plank>
          <Plank mark="loose" time="Fri">
            Friday's hours: <Hours minutes={180} /> or <Hours minutes={150} />?
          </Plank>
          <Plank mark="struck" time="10:05">
            <s>Coat six on the deck.</s>
            <p className="text-slate">Struck by Orrin: it was the cabin sides.</p>
          </Plank>
        </Planks>
        <DayTicks days={WEEKEND}>Sat and Sun: no one in</DayTicks>
        <DayHead dayOfStay={60} date="Fri 28 Aug" note="sent" />
        <Planks>
          <Plank mark="released" time="10:10">
            Coat six, 59 percent.
          </Plank>
        </Planks>
        <DayTicks days={FORTNIGHT}>Thirteen days: waiting for the deck beams</DayTicks>
        <DayHead dayOfStay={141} date="Tuesday 12 May" />
        <Planks>
          <Plank mark="sent">A row without a time.</Plank>
        </Planks>
        <DayHead dayOfStay={null} date="Before she came" />
        <Planks>
          <Plank mark="sent" time="16:42">
            Measured her on the mooring.
          </Plank>
        </Planks>
      </Ribband>
    </Page>
  );
}
