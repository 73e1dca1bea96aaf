import type { KeyboardEventHandler, Ref } from 'react';
import { Kbd } from '@/components/ui/Kbd';

const NAME = 'Find a job, part, engine or torque';

/** The large field. It keeps its own text, so that nothing typed is lost before the page comes to life. */
export function SearchField({
  ref,
  defaultValue,
  onText,
  onKeyDown,
}: {
  ref: Ref<HTMLInputElement>;
  defaultValue: string;
  onText: (text: string) => void;
  onKeyDown: KeyboardEventHandler;
}) {
  return (
    <>
      <div className="relative">
        <input
          ref={ref}
          type="search"
          name="q"
          data-find
          defaultValue={defaultValue}
          maxLength={200}
          aria-label={NAME}
          placeholder={NAME}
          autoComplete="off"
          autoCapitalize="off"
          spellCheck={false}
          enterKeyHint="go"
          aria-describedby="look-up-keys"
          onInput={({ currentTarget }) => {
            onText(currentTarget.value);
          }}
          onKeyDown={onKeyDown}
          className="h-[58px] w-full rounded border-2 border-ink bg-white pl-4 pr-4 font-serif text-[1.125rem] sm:h-[68px] sm:pl-5 sm:pr-16 sm:text-[1.5625rem] [&::-webkit-search-cancel-button]:hidden"
        />
        <span
          data-needs-script
          aria-hidden="true"
          className="pointer-events-none absolute right-5 top-1/2 -translate-y-1/2 max-sm:hidden"
        >
          <Kbd>/</Kbd>
        </span>
      </div>
      <span id="look-up-keys" className="sr-only" data-needs-script>
        Enter opens the first sheet. Arrow down goes into the list, Escape clears.
      </span>
      <noscript>
        <button className="mt-3 min-h-touch rounded border-frame border-petrol bg-petrol px-5 font-semibold text-white">
          Look up
        </button>
      </noscript>
    </>
  );
}
