import type { RouteObject } from 'react-router-dom';
import { paths } from './paths.ts';

/** The rule in words, for everybody. */
export const ruleRoutes: RouteObject[] = [
  {
    path: paths.adminRules.path,
    lazy: async () => ({
      Component: (await import('./pages/admin-rules-page.tsx')).AdminRulesPage,
    }),
  },
  {
    path: paths.rule.path,
    lazy: async () => ({ Component: (await import('./pages/admin/rule-page.tsx')).RulePage }),
  },
];

/** Writing it, below RequireRole. */
export const ruleWritingRoutes: RouteObject[] = [
  {
    path: paths.newRule.path,
    lazy: async () => ({
      Component: (await import('./pages/admin/new-rule-page.tsx')).NewRulePage,
    }),
  },
  {
    path: paths.ruleEdit.path,
    lazy: async () => ({
      Component: (await import('./pages/admin/rule-edit-page.tsx')).RuleEditPage,
    }),
  },
];

/** Trying it on a case, below RequireRole. */
export const ruleTrialRoutes: RouteObject[] = [
  {
    path: paths.ruleTrial.path,
    lazy: async () => ({
      Component: (await import('./pages/admin/rule-trial-page.tsx')).RuleTrialPage,
    }),
  },
];
