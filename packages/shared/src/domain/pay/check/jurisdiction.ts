import { z } from 'zod';
import { OVERTIME_RULE_SETS, overtimeRuleSet } from '../overtime-rule-sets.ts';

const KNOWN = OVERTIME_RULE_SETS.map((set) => set.jurisdiction);

/** "US-FLSA", "US-CA" ... to its overtime rules; the federal ones when nothing is named. */
export const jurisdictionField = z
  .string({ error: 'needs a text such as "US-FLSA"' })
  .default('US-FLSA')
  .transform((code, ctx) => {
    const key = ['US', 'US-FEDERAL'].includes(code) ? 'US-FLSA' : code;
    if (KNOWN.includes(key)) return overtimeRuleSet(key);
    ctx.addIssue({ code: 'custom', message: `"${code}" is not known here; known are ${KNOWN.join(', ')}` });
    return z.NEVER;
  });
