import { Button } from '@/components/ui/Button';
import { Field } from '@/components/ui/Field';

/** Asks for which book and under which title; the rest is written at the desk. */
export function NewProcedure({
  books,
  chosen,
  title,
  error,
}: {
  books: readonly { book: string; name: string }[];
  chosen: string | undefined;
  title: string;
  /** What was wrong with what was sent. */
  error: string | undefined;
}) {
  const first = chosen ?? books[0]?.book;
  return (
    <form method="post" className="leaf framed-sections mx-auto max-w-[46rem]">
      <div className="px-5 py-6 sm:px-9">
        <h1 className="text-title">Write a new procedure</h1>
        <p className="mt-2 max-w-prose text-ink-2">
          You start from a short example that is complete: a caution, a limit, a torque in two passes, a hold point.
          Write over it step by step. Nobody else sees it until you propose it.
        </p>
      </div>
      <div className="flex flex-col gap-6 px-5 py-6 sm:px-9">
        <Field
          label="Which task?"
          hint="As somebody would ask for it: Replace the thermostat."
          name="title"
          defaultValue={title}
          maxLength={90}
          required
          autoComplete="off"
          error={error}
        />
        <fieldset>
          <legend className="mb-1 font-medium">For which book?</legend>
          {books.map(({ book, name }) => (
            <label key={book} className="flex min-h-touch cursor-pointer items-center gap-3">
              <input
                type="radio"
                name="book"
                value={book}
                defaultChecked={book === first}
                className="size-[1.15rem] accent-petrol"
              />
              {name}
            </label>
          ))}
        </fieldset>
        <div>
          <Button type="submit" kind="main">
            Start writing
          </Button>
        </div>
      </div>
    </form>
  );
}
