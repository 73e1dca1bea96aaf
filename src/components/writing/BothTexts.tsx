/** Two texts side by side, to be read and copied. */
export const BothTexts = ({ texts }: { texts: readonly { name: string; text: string }[] }) => (
  <details className="mt-2">
    <summary className="inline-flex min-h-touch cursor-pointer items-center font-semibold text-petrol underline underline-offset-[3px]">
      Show both texts
    </summary>
    <div className="mt-1 grid gap-4 md:grid-cols-2">
      {texts.map(({ name, text }) => (
        <label key={name} className="flex flex-col gap-1.5 font-medium">
          {name}
          <textarea
            readOnly
            value={text}
            rows={14}
            className="field-box resize-y whitespace-pre font-sans text-small"
          />
        </label>
      ))}
    </div>
  </details>
);
