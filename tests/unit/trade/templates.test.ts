import { describe, expect, test } from 'vitest';
import { NO_SOURCE } from '#shared/trade/gate.ts';
import { TEMPLATE_IDS, loadRules, loadTemplate } from '#shared/trade/load.ts';
import { BrokenTemplate } from '#shared/trade/stage-order.ts';
import { isMadeEach } from '#shared/trade/template.ts';
import { checkTemplate } from '#shared/trade/whole-template.ts';

const templates = await Promise.all(TEMPLATE_IDS.map(loadTemplate));
const rules = await loadRules();

const size = (id: string) => {
  const { stages } = templates.find((template) => template.id === id)!;
  const tasks = stages.flatMap((stage) => stage.tasks);
  const minutes = tasks.reduce((sum, { estimateMinutes }) => sum + estimateMinutes, 0);
  return { stages: stages.length, tasks: tasks.length, hours: minutes / 60 };
};

describe('the stage templates', () => {
  test('all parse, with the stages, tasks and hours that the trade gave them', () => {
    expect(TEMPLATE_IDS.map((id) => [id, size(id)])).toEqual([
      ['varnished_planked', { stages: 20, tasks: 128, hours: 1271.5 }],
      ['painted_lapstrake', { stages: 11, tasks: 54, hours: 437 }],
      ['annual_refit', { stages: 7, tasks: 24, hours: 74 }],
    ]);
  });

  test('are called by the names under which they are asked for', () => {
    expect(templates.map(({ id }) => id)).toEqual(TEMPLATE_IDS);
  });

  test('take 0.5 h as 30 minutes and a wait of 4 to 72 h as 240 to 4320', () => {
    const [planked, lapstrake] = templates;
    const booking = lapstrake!.stages
      .flatMap(({ tasks }) => tasks)
      .find(({ id }) => id === 'book_leak_watch');
    expect(booking?.estimateMinutes).toBe(30);
    expect(planked!.stages[1]!.waits[0]!.typicalMinutes).toEqual([240, 4320]);
  });

  test('say of a figure where it is from, or that it has no source', () => {
    const gates = templates.flatMap(({ stages }) =>
      stages.flatMap((stage) => [...stage.gates, ...stage.tasks.flatMap((task) => task.gates)]),
    );
    const sources = gates.flatMap((gate) => ('source' in gate ? [[gate.type, gate.source]] : []));
    const sourced = sources.filter(([, source]) => source !== NO_SOURCE);
    expect(sourced).toHaveLength(3);
    expect(new Set(sourced.map(([type]) => type))).toEqual(new Set(['moisture_range']));
    expect(sources.length - sourced.length).toBe(22);
  });

  test('number the tasks that are made for each of something', () => {
    const each = templates.flatMap(({ stages }) => stages.flatMap(({ tasks }) => tasks)).filter(isMadeEach);
    expect(each).toHaveLength(13);
  });
});

describe('a broken template is refused with what is wrong', () => {
  const broken = (change: (template: (typeof templates)[number]) => void) => {
    const template = structuredClone(templates[2]!);
    change(template);
    return () => checkTemplate(template, rules);
  };

  test('an unchanged one passes', () => {
    expect(broken(() => {})).not.toThrow();
  });

  test('stages in a circle', () => {
    const check = broken(({ stages }) => stages[0]!.after.push('close'));
    expect(check).toThrow(BrokenTemplate);
    expect(check).toThrow(/circle: inspect after close after .* after inspect$/);
  });

  test('a stage after one that is not there', () => {
    expect(broken(({ stages }) => stages[0]!.after.push('rigging'))).toThrow(
      'stage inspect comes after rigging',
    );
  });

  test('two stages of one id', () => {
    expect(broken(({ stages }) => stages.push(stages[0]!))).toThrow('two stages have one id');
  });

  test('two tasks of one id', () => {
    expect(broken(({ stages }) => stages[1]!.tasks.push(stages[0]!.tasks[0]!))).toThrow(
      'two tasks have the id haul_meet_wash',
    );
  });

  test('a caution that nobody wrote', () => {
    expect(broken(({ stages }) => stages[0]!.tasks[0]!.cautions.push('lightning'))).toThrow(
      'the caution lightning',
    );
  });

  test.each([
    { type: 'task_done', task: 'polish', named: 'the task polish' },
    { type: 'checklist', checklist: 'rigging', named: 'the checklist rigging' },
    { type: 'checklist', checklist: 'sea_trial', when: { open: 'mast' }, named: 'the stage mast' },
  ] as const)('a gate that names $named', ({ named, ...gate }) => {
    const check = broken(({ stages }) =>
      stages[0]!.gates.push({ text: 'x', reason: 'x', strength: 'stop', ...gate }),
    );
    expect(check).toThrow(named);
  });
});
