import type { RuleSetting } from './rules';

/** A rule of thumb as the API answers it. */
export const ruleReply = ({ rule, set }: RuleSetting) => {
  const { name, worksheet, field, label, unit, usual, above, least, most } = rule;
  return {
    name,
    worksheet: worksheet.name,
    field,
    label,
    unit,
    usual,
    set: set?.value ?? null,
    setBy: set?.by ?? null,
    setAt: set?.at ?? null,
    ...(above !== undefined && { above }),
    ...(least !== undefined && { least }),
    ...(most !== undefined && { most }),
  };
};
