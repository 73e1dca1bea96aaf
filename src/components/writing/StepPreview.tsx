import { Step } from '@/components/sheet/Step';
import { useDesk } from './desk';
import type { Checked } from './useCheck';

/** The step that is being written, as the sheet will show it on a narrow screen. */
export function StepPreview({ checked }: { checked: Checked }) {
  const { place } = useDesk();
  const { preview, previewIsOld } = checked;
  const id = typeof place === 'object' && 'step' in place ? place.step : null;
  const step = preview?.steps.find((one) => one.id === id);
  if (id === null) return null;
  return (
    <section aria-label="How it will read">
      <h2 className="mb-1.5 text-[1rem]">How it will read</h2>
      {preview && step ? (
        <>
          {previewIsOld && <p className="mb-1.5 text-ink-2">As it was before what is to mend.</p>}
          <div className="narrow-sheet frame">
            <Step step={step} frontmatter={preview.frontmatter} anchors={false} />
          </div>
        </>
      ) : (
        <p className="text-ink-2">Shown once the text can be read.</p>
      )}
    </section>
  );
}
