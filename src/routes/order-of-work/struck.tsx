import { useState } from 'react';
import { BungMark } from '#src/components/bung-mark.tsx';
import { Key } from '#src/components/key.tsx';
import { Section } from '#src/components/page.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { Why } from '#src/components/why.tsx';
import { useHold } from '#src/replica/hooks.tsx';
import type { OrderOfWork } from './read-order.ts';

interface StruckLine {
  entity: 'stage' | 'task';
  id: string;
  title: string;
  why: string;
}

/** Stages and tasks that were struck, and the way back. */
export function Struck({ order }: { order: OrderOfWork }) {
  const { mutate: hold } = useHold();
  const [asked, setAsked] = useState<StruckLine | null>(null);
  const lines: StruckLine[] = [
    ...order.struckStages.map(({ id, name, struck }) => ({
      entity: 'stage' as const,
      id,
      title: name,
      why: struck!.why,
    })),
    ...order.struckTasks.map(({ id, title, struck }) => ({
      entity: 'task' as const,
      id,
      title,
      why: struck!.why,
    })),
  ];
  if (lines.length === 0) return null;
  return (
    <Section title="Struck">
      <Planks>
        {lines.map((line) => (
          <li key={line.id} className="flex items-center gap-3 bg-plank px-4 py-2 md:px-6">
            <BungMark mark="struck" />
            <p className="min-w-0 flex-1 leading-snug break-words">
              {line.title} <span className="text-slate">· {line.why}</span>
            </p>
            {order.mayChange && (
              <Key onClick={() => setAsked(line)}>
                Restore<span className="sr-only"> {line.title}</span>
              </Key>
            )}
          </li>
        ))}
      </Planks>
      <Why
        isOpen={asked !== null}
        onClose={() => setAsked(null)}
        title={`Restore ${asked?.title ?? ''}`}
        question="Why is it restored?"
        confirm="Restore it"
        onConfirm={(why) => {
          if (asked)
            hold({ kind: `${asked.entity}.restore`, data: { [`${asked.entity}Id`]: asked.id, why } });
          setAsked(null);
        }}
      />
    </Section>
  );
}
