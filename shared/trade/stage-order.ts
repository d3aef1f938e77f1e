interface Ordered {
  id: string;
  after: string[];
}

/** A template says what cannot be: ids used twice, names of what is not there, stages that wait for one another. */
export class BrokenTemplate extends Error {
  override name = 'BrokenTemplate';
}

/**
 * Stages so that each stands behind all that it comes after, and otherwise as they were listed.
 * Throws BrokenTemplate where one comes after a stage that is not there, or where they wait for one another in a circle.
 */
export function inOrder<S extends Ordered>(stages: S[]): S[] {
  const byId = new Map(stages.map((stage) => [stage.id, stage]));
  if (byId.size < stages.length) throw new BrokenTemplate('two stages have one id');
  const placed = new Set<S>();
  for (const stage of stages) place(stage, byId, placed, []);
  return [...placed];
}

function place<S extends Ordered>(stage: S, byId: Map<string, S>, placed: Set<S>, waiting: S[]): void {
  if (placed.has(stage)) return;
  if (waiting.includes(stage))
    throw new BrokenTemplate(circleWords([...waiting.slice(waiting.indexOf(stage)), stage]));
  for (const id of stage.after) {
    const before = byId.get(id);
    if (!before) throw new BrokenTemplate(`stage ${stage.id} comes after ${id}, which is not there`);
    place(before, byId, placed, [...waiting, stage]);
  }
  placed.add(stage);
}

function circleWords(circle: Ordered[]): string {
  return `stages wait for one another in a circle: ${circle.map(({ id }) => id).join(' after ')}`;
}
