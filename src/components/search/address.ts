import { type Filters, readFilters } from '@/domain/search/filters';

/** What is looked up; the address of the page says the same. */
export interface Asked {
  q: string;
  filters: Filters;
}

/** The parameters that say it: filters repeat a name, as a form does. */
export function parametersOf({ q, filters }: Asked): URLSearchParams {
  const parameters = new URLSearchParams();
  if (q.trim()) parameters.set('q', q);
  for (const [name, values] of Object.entries(filters))
    for (const value of values as readonly string[]) parameters.append(name, value);
  return parameters;
}

export function addressOf(asked: Asked): string {
  const parameters = parametersOf(asked).toString();
  return parameters ? `/?${parameters}` : '/';
}

export const askedIn = (parameters: URLSearchParams, engines: readonly string[]): Asked => ({
  q: (parameters.get('q') ?? '').slice(0, 200),
  filters: readFilters(parameters, engines),
});
