import type { ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import { Field } from '@/components/ui/Field';
import { TextArea } from '@/components/ui/TextArea';
import type { TemplateToChoose } from '@/domain/writing/templates';
import { TemplateChoice } from './TemplateChoice';
import { Choice, FieldError, Way } from './Way';

/** What was typed, as it came or as the address says. */
export interface TypedBeginning {
  title: string;
  book: string;
  from: string;
  template: string;
  markdown: string;
}

const Heading = ({ children }: { children: string }) => <legend className="mb-1.5 font-medium">{children}</legend>;

function ImportFields({ markdown, errors }: { markdown: string; errors: Readonly<Record<string, string>> }) {
  return (
    <div className="flex flex-col gap-5">
      <div className="flex min-w-0 flex-col gap-1.5">
        <label htmlFor="file" className="font-medium">
          A document
        </label>
        <p id="file-hint" className="-mt-1 text-small text-ink-2">
          Word processor document (.docx) or text file with Markdown, 5 MB at most.
        </p>
        <input
          id="file"
          name="file"
          type="file"
          accept=".docx,.md,.markdown,.txt"
          aria-describedby={`file-hint${errors['file'] ? ' file-error' : ''}`}
          aria-invalid={errors['file'] ? true : undefined}
          className="field-box file:mr-3 file:cursor-pointer file:rounded file:border-frame file:border-solid file:border-ink file:bg-sheet file:px-3 file:py-1 file:font-sans file:font-medium"
        />
        <FieldError id="file-error" error={errors['file']} />
      </div>
      <TextArea
        label="Or paste a text"
        name="markdown"
        hint="Plain text or Markdown. The first heading becomes the title, headings or numbered points become the steps."
        rows={6}
        defaultValue={markdown}
        error={errors['markdown']}
      />
      <p className="max-w-prose text-ink-2">
        Nothing is stored yet: you see first what was found, which numbers are to be made into values, and what a sheet
        cannot hold.
      </p>
      <div>
        <Button type="submit" name="act" value="read" kind="main" className="begin-read">
          Read it
        </Button>
      </div>
    </div>
  );
}

/** Asks for which book, from what, and under which title; the rest is written at the desk. */
export function NewProcedure({
  books,
  templates,
  typed,
  errors,
  copy,
}: {
  books: readonly { book: string; name: string }[];
  templates: readonly TemplateToChoose[];
  typed: TypedBeginning;
  /** What was wrong with what was sent, by field. */
  errors: Readonly<Record<string, string>>;
  /** Where a sheet is chosen that is copied. */
  copy?: ReactNode;
}) {
  const first = books.some(({ book }) => book === typed.book) ? typed.book : books[0]?.book;
  return (
    <form method="post" encType="multipart/form-data" className="leaf framed-sections begin max-w-[52rem] sm:mx-auto">
      <div className="relative px-5 py-6 sm:px-9">
        {/* The button that Enter presses in a field: the first of the form. */}
        <button type="submit" name="act" value="start" className="sr-only" tabIndex={-1} aria-hidden="true">
          Start
        </button>
        <h1 className="text-title">Write a new procedure</h1>
        <p className="mt-2 max-w-prose text-ink-2">Nobody else sees it until you propose it.</p>
      </div>
      <div className="px-5 py-6 sm:px-9">
        <fieldset>
          <Heading>For which book?</Heading>
          {books.map(({ book, name }) => (
            <Choice key={book} name="book" value={book} chosen={book === first} label={name} />
          ))}
        </fieldset>
      </div>
      <div className="px-5 py-6 sm:px-9">
        <fieldset className="min-w-0">
          <Heading>How do you begin?</Heading>
          <div className="divide-y divide-hair border-y border-hair">
            <Way
              way="empty"
              now={typed.from}
              label="With an empty sheet"
              hint="Its bones, and a mark wherever you must write."
            />
            <Way
              way="template"
              now={typed.from}
              label="From a template"
              hint="Steps in a good order and the cautions that such work always needs. No numbers: those are yours."
            >
              <TemplateChoice templates={templates} chosen={typed.template} error={errors['template']} />
            </Way>
            <Way
              way="copy"
              now={typed.from}
              label="From a sheet that is there"
              hint="Its steps and values come over. Each torque and limit must be checked for the new job."
            >
              {copy}
              <FieldError id="sheet-error" error={errors['sheet']} />
            </Way>
            <Way
              way="import"
              now={typed.from}
              label="From a document"
              hint="A how-to that you have as a file or as text."
            >
              <ImportFields markdown={typed.markdown} errors={errors} />
            </Way>
          </div>
        </fieldset>
      </div>
      <div className="begin-title flex flex-col gap-6 px-5 py-6 sm:px-9">
        <Field
          label="Which task?"
          hint="As somebody would ask for it: Replace the thermostat."
          name="title"
          defaultValue={typed.title}
          maxLength={90}
          autoComplete="off"
          error={errors['title']}
        />
        <div>
          <Button type="submit" name="act" value="start" kind="main">
            Start writing
          </Button>
        </div>
      </div>
    </form>
  );
}
