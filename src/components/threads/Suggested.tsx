import type { Suggestion } from '@/domain/review/suggestions';

/** What would be replaced, and by what. */
export function Suggested({ suggestion }: { suggestion: Suggestion }) {
  const value = suggestion.kind === 'value';
  const from = suggestion.kind === 'value' ? suggestion.fromText : suggestion.quote;
  const to = suggestion.kind === 'value' ? suggestion.toText : suggestion.replacement;
  return (
    <dl className="suggested" data-value={value || undefined}>
      <div>
        <dt>Instead of</dt>
        <dd>
          <del className="suggested-old">{from}</del>
        </dd>
      </div>
      <div>
        <dt>Write</dt>
        <dd>{to ? <ins className="suggested-new">{to}</ins> : 'nothing: leave it out'}</dd>
      </div>
    </dl>
  );
}
