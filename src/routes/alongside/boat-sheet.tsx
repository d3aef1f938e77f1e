import { useState } from 'react';
import { keyLook } from '#src/components/key-look.ts';
import { Icon } from '#src/components/icons.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { readBoats, type BoatToChoose, type Where } from '#src/routes/alongside/read-boats.ts';

interface BoatSheetProps {
  isOpen: boolean;
  where: Where | null;
  onClose: () => void;
  onChoose: (where: Where) => void;
}

const CHOSEN = 'aria-pressed:bg-bilge aria-pressed:text-primer';

/** A boat, then her stage. A boat without stages is chosen at once. */
export function BoatSheet({ isOpen, ...rest }: BoatSheetProps) {
  return isOpen ? <OpenBoatSheet {...rest} /> : null;
}

function OpenBoatSheet({ where, onClose, onChoose }: Omit<BoatSheetProps, 'isOpen'>) {
  const boats = useRead(['boats'], readBoats);
  const [boatId, setBoatId] = useState(where?.boatId);
  const boat = boats.find(({ id }) => id === boatId);

  function chooseBoat(chosen: BoatToChoose) {
    setBoatId(chosen.id);
    if (chosen.stages.length === 0) onChoose({ boatId: chosen.id, stageId: null });
  }

  return (
    <Sheet isOpen onClose={onClose} title="Which boat, which stage?">
      <div role="group" aria-label="Boats" className="grid gap-3 min-[360px]:grid-cols-2">
        {boats.map((each) => (
          <button
            key={each.id}
            type="button"
            aria-pressed={each.id === boatId}
            className={`${keyLook('plain')} ${CHOSEN}`}
            onClick={() => chooseBoat(each)}
          >
            {each.id === boatId && <Icon name="tick" />}
            <span>{each.name}</span>
          </button>
        ))}
      </div>
      {boat && <Stages boat={boat} where={where} onChoose={onChoose} />}
    </Sheet>
  );
}

function Stages({
  boat,
  where,
  onChoose,
}: { boat: BoatToChoose } & Pick<BoatSheetProps, 'where' | 'onChoose'>) {
  return (
    <div role="group" aria-label={`Stages of ${boat.name}`} className="grid gap-3">
      <h3 className="pt-1 font-semibold">Her stage</h3>
      {boat.stages.map((stage) => (
        <button
          key={stage.id}
          type="button"
          aria-pressed={stage.id === where?.stageId}
          className={`${keyLook('plain')} ${CHOSEN} !justify-between !text-left`}
          onClick={() => onChoose({ boatId: boat.id, stageId: stage.id })}
        >
          <span className="flex items-center gap-2">
            {stage.id === where?.stageId && <Icon name="tick" />}
            {stage.name}
          </span>
          {stage.isDone && <span className="font-normal">finished</span>}
        </button>
      ))}
    </div>
  );
}
