import { ruleText, ruleUnit, ruleWords } from '@/domain/worksheets/ruleWords';
import type { RuleOfThumb } from '@/domain/worksheets/shopRules';
import { Button } from '@/components/ui/Button';
import { dayOf } from '@/components/ui/day';
import { Field } from '@/components/ui/Field';
import { Notice } from '@/components/ui/Notice';
import { Cell, Row, Table } from '@/components/ui/Table';
import { VisuallyHidden } from '@/components/ui/VisuallyHidden';

type Units = 'metric' | 'inch';

/** A rule of thumb and what the shop has set for it. */
export interface RuleLine {
  rule: RuleOfThumb;
  set: { value: number; by: { name: string }; at: string } | null;
}

export interface RulesState {
  /** How many rules were changed by the form that was just sent. */
  saved?: number | undefined;
  /** What kept the form from being saved: errors and what was typed, by the names of the rules. */
  refused?: { detail: string; errors: Record<string, string>; typed: Record<string, string> } | undefined;
}

const COLUMNS = [
  { key: 'rule', label: 'Rule' },
  { key: 'usual', label: 'Usual in the trade' },
  { key: 'set', label: 'This shop' },
];

function Line({ rule, set, units, typed, error }: RuleLine & { units: Units; typed?: string; error?: string }) {
  const { name, label, hint, usual, worksheet } = rule;
  const unit = ruleUnit(rule, units);
  return (
    <Row>
      <Cell className="sm:w-[46%]">
        <span id={name} className="font-medium">
          {label}
        </span>
        {hint && <span className="block max-w-[56ch] text-small text-ink-2">{hint}</span>}
      </Cell>
      <Cell label="Usual in the trade" className="whitespace-nowrap sm:w-[20%] sm:py-6">
        {ruleWords(rule, usual, units)}
      </Cell>
      <Cell className="max-sm:pt-2">
        <input type="hidden" name={`was.${name}`} value={set ? String(set.value) : ''} />
        <Field
          name={`value.${name}`}
          label={
            <span className="font-normal text-ink-2 sm:sr-only">
              This shop
              <VisuallyHidden>
                : {label}, {worksheet.title}
              </VisuallyHidden>
            </span>
          }
          defaultValue={typed ?? ruleText(rule, set?.value ?? null, units)}
          error={error}
          {...(unit !== undefined && { unit })}
          fieldClass="max-w-[18rem]"
          className="tabular-nums"
          autoComplete="off"
          spellCheck={false}
          maxLength={60}
        />
        {set && (
          <p className="mt-1 text-small text-ink-2">
            {ruleWords(rule, set.value, units)} set by {set.by.name}, {dayOf(set.at)}
          </p>
        )}
      </Cell>
    </Row>
  );
}

/** What came of the form; first in it, because the page comes back at its top. Leads to each box that cannot be used. */
function Answer({ lines, saved, refused }: { lines: readonly RuleLine[] } & RulesState) {
  if (refused)
    return (
      <Notice live="alert" title={refused.detail}>
        <ul className="flex flex-wrap gap-x-5">
          {lines
            .filter(({ rule }) => refused.errors[rule.name])
            .map(({ rule }) => (
              <li key={rule.name}>
                <a href={`#${rule.name}`} className="inline-flex min-h-7 items-center">
                  {rule.worksheet.title}: {rule.label}
                </a>
              </li>
            ))}
        </ul>
      </Notice>
    );
  return saved === undefined ? null : (
    <p role="status" className="font-medium">
      {savedWords(saved)}
    </p>
  );
}

/** All rules of thumb of a shop in one form that works without a script. */
export function RulesForm({
  lines,
  units,
  shopId,
  saved,
  refused,
}: { lines: readonly RuleLine[]; units: Units; shopId: string } & RulesState) {
  const worksheets = [...new Map(lines.map(({ rule }) => [rule.worksheet.name, rule.worksheet])).values()];
  return (
    <form method="post" action={`/shop/rules?shop=${shopId}`}>
      <input type="hidden" name="units" value={units} />
      {(refused || saved !== undefined) && (
        <div className="px-4 pt-5 sm:px-9">
          <Answer lines={lines} saved={saved} refused={refused} />
        </div>
      )}
      {worksheets.map((worksheet) => (
        <section key={worksheet.name} className="border-b border-rule px-4 pb-3 pt-6 sm:px-9">
          <h2 className="text-lead">
            <a href={`/handbook/calculators/${worksheet.name}`}>{worksheet.title}</a>
          </h2>
          <div className="mt-2">
            <Table caption={`Rules of thumb: ${worksheet.title}`} columns={COLUMNS}>
              {lines
                .filter(({ rule }) => rule.worksheet.name === worksheet.name)
                .map((line) => (
                  <Line
                    key={line.rule.name}
                    {...line}
                    units={units}
                    typed={refused?.typed[line.rule.name]}
                    error={refused?.errors[line.rule.name]}
                  />
                ))}
            </Table>
          </div>
        </section>
      ))}
      <div className="px-4 py-6 sm:px-9">
        <Button type="submit" kind="main">
          Save
        </Button>
      </div>
    </form>
  );
}

const savedWords = (changed: number): string =>
  changed === 0 ? 'Saved. Nothing was changed.' : `Saved. ${changed === 1 ? 'One rule' : `${changed} rules`} changed.`;
