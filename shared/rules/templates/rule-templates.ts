import { boundaryTemplates } from './boundaries.ts';
import { collectorTemplates, openSpaceTemplates } from './collectors.ts';
import { gardenTemplates } from './gardens.ts';
import type { RuleTemplate } from './rule-template.ts';
import { windowTemplates } from './windows.ts';

export type { RuleTemplate };

/** Every published approach that the rule model knows, as rules to begin from. */
export const ruleTemplates: readonly RuleTemplate[] = [
  ...gardenTemplates,
  ...windowTemplates,
  ...boundaryTemplates,
  ...collectorTemplates,
  ...openSpaceTemplates,
];
