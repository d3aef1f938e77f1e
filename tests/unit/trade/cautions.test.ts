import { describe, expect, test } from 'vitest';
import { TEMPLATE_IDS, loadRules, loadTemplate } from '#shared/trade/load.ts';
import { CAUTION_BRIEF_CHARS_MAX } from '#shared/trade/rules.ts';
import { findTaskTemplate, taskTemplate, templateIdOf } from '#shared/trade/task-template.ts';

const rules = await loadRules();
const templates = await Promise.all(TEMPLATE_IDS.map(loadTemplate));

// the dangers whose cautions are asked about: where they stand was judged task by task, against the list below
const LEAD = [
  'varnished_planked/check_lead_old_paint_note',
  'varnished_planked/strip_deck_covering_boards',
  'varnished_planked/strip_topsides_one_side',
  'varnished_planked/strip_transom',
  'varnished_planked/scrape_seams_clean_edges',
  'varnished_planked/strip_bottom_paint_is_loose',
  'varnished_planked/clean_up_bag_dispose_waste',
  'varnished_planked/sand_mask_waterline',
  'painted_lapstrake/lead_test_old_paint',
  'painted_lapstrake/strip_outside_per_side',
  'painted_lapstrake/strip_inside',
  'painted_lapstrake/clean_lap_edges_hook_do',
  'painted_lapstrake/waste_local_rule',
  'annual_refit/sand_bottom_vacuum',
];
const BLEACH = [
  'varnished_planked/test_patch',
  'varnished_planked/apply_bleach_even_coats',
  'varnished_planked/neutralise_rinse_bleach_asks',
  'varnished_planked/rinse_twice_more',
];
const FUEL = [
  'varnished_planked/disconnect_battery_drain_remove_fuel',
  'varnished_planked/remove_engine_shaft_strut_rudder',
  'varnished_planked/fuel_tank_clean_test_replace',
  'varnished_planked/exhaust_cooling_fuel_hoses',
  'varnished_planked/run_check_leaks_pressures',
  'varnished_planked/trial_run_adjustments',
  'painted_lapstrake/engine_service',
  'annual_refit/steering_pump_wiring_checks',
  'annual_refit/service_per_list',
  'annual_refit/start_leak_check',
  'annual_refit/lay_up_drain_fog_antifreeze',
];
const LIFTING = [
  'varnished_planked/set_keel_blocks_stands_level',
  'varnished_planked/remove_engine_shaft_strut_rudder',
  'varnished_planked/turn_boat_over_shop_does',
  'varnished_planked/graving_pieces_stem_keel',
  'varnished_planked/check_hull_fair_true_after',
  'varnished_planked/turn_boat_back_she_was',
  'varnished_planked/take_bracing_out_order_agreed',
  'varnished_planked/install_engine_shaft_strut_packing',
  'varnished_planked/launch_leak_watch',
  'varnished_planked/haul_recheck_correct_list',
  'painted_lapstrake/block_wide_pads_check_twist',
  'painted_lapstrake/turn_boat_over_shop_does',
  'painted_lapstrake/turn_boat_back_she_was',
  'painted_lapstrake/launch_pump_watch',
  'annual_refit/haul_meet_wash',
  'annual_refit/sand_bottom_vacuum',
  'annual_refit/bottom_paint',
  'annual_refit/anodes_packing_seacocks',
  'annual_refit/launch_cover',
];

/** The tasks that carry a caution, in the order of the templates. */
function carrying(cautionId: string): string[] {
  return templates.flatMap((template) =>
    template.stages.flatMap(({ tasks }) =>
      tasks
        .filter(({ cautions }) => cautions.includes(cautionId))
        .map((task) => templateIdOf(template, task)),
    ),
  );
}

describe('cautions stand on the tasks they belong to and nowhere else', () => {
  test.each([
    ['lead', LEAD],
    ['two_part_bleach', BLEACH],
    ['petrol', FUEL],
    ['lifting', LIFTING],
  ])('%s', (id, tasks) => {
    expect(carrying(id)).toEqual(tasks);
  });

  test('oxalic acid also where its dried crystals are sanded', () => {
    expect(carrying('oxalic')).toEqual([...BLEACH, 'varnished_planked/light_sand_raised_grain_dust']);
  });

  test('none is without a task', () => {
    expect(rules.cautions.filter(({ id }) => carrying(id).length === 0)).toEqual([]);
  });

  test.each([
    'varnished_planked/inventory_loose_parts_missing_parts',
    'varnished_planked/write_findings_list_estimate_range',
    'varnished_planked/dry_read_moisture_grid',
    'varnished_planked/care_next_visit_list',
    'painted_lapstrake/moisture_map',
    'annual_refit/call_send_list_record_answers',
  ])('%s has none', async (templateId) => {
    expect((await taskTemplate(templateId))?.cautions).toEqual([]);
  });
});

describe('a caution is short and says who decides', () => {
  const WHO_DECIDES = /\b(label|labels|local (fuel )?code|local rules|fire code|licensed electrician)\b/;

  test.each(rules.cautions.map((caution) => [caution.id, caution] as const))('%s', (_id, { brief }) => {
    expect(brief.length).toBeLessThanOrEqual(CAUTION_BRIEF_CHARS_MAX);
    expect(brief.toLowerCase()).toMatch(WHO_DECIDES);
  });

  test('and is never had without the note that stands above it', async () => {
    const text = await taskTemplate('varnished_planked/apply_bleach_even_coats');
    expect(text?.safetyNote).toMatch(/label, safety data sheet, local law and licensed trades decide/);
    expect(text?.cautions.map(({ id }) => id)).toEqual(['two_part_bleach', 'oxalic', 'steel_wool']);
  });
});

describe("a task's templateId leads to the template's text", () => {
  test('for every task of every template', () => {
    for (const template of templates) {
      for (const stage of template.stages) {
        for (const task of stage.tasks) {
          const text = findTaskTemplate(template, templateIdOf(template, task));
          expect([text?.stage.id, text?.task.id]).toEqual([stage.id, task.id]);
        }
      }
    }
  });

  test.each([
    'rigging/step_mast',
    'annual_refit/step_mast',
    'annual_refit',
    'bottom_paint',
    '',
    'constructor/x',
  ])('%j leads nowhere', async (templateId) => {
    expect(await taskTemplate(templateId)).toBeUndefined();
  });
});
