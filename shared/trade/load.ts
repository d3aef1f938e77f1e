import { rulesSchema, type Rules } from './rules.ts';
import { templateFileSchema, type TemplateFile } from './template.ts';
import { checkTemplate } from './whole-template.ts';

// each is a chunk of its own, so that a screen that needs none carries none
const FILES = {
  varnished_planked: () => import('./templates/varnished_planked.json', { with: { type: 'json' } }),
  painted_lapstrake: () => import('./templates/painted_lapstrake.json', { with: { type: 'json' } }),
  annual_refit: () => import('./templates/annual_refit.json', { with: { type: 'json' } }),
};

export type TemplateId = keyof typeof FILES;
export const TEMPLATE_IDS = Object.keys(FILES) as TemplateId[];

/** A stage template with what holds for all of them. */
export interface Template extends TemplateFile {
  rules: Rules;
}

export function isTemplateId(text: string): text is TemplateId {
  return Object.hasOwn(FILES, text);
}

/** Reads a template, checked whole. Rejects where its file cannot be had; throws BrokenTemplate where the file is wrong. */
export async function loadTemplate(id: TemplateId): Promise<Template> {
  const [file, rules] = await Promise.all([FILES[id](), loadRules()]);
  const template = templateFileSchema.parse(file.default);
  checkTemplate(template, rules);
  return { ...template, rules };
}

export async function loadRules(): Promise<Rules> {
  const file = await import('./rules.json', { with: { type: 'json' } });
  return rulesSchema.parse(file.default);
}
