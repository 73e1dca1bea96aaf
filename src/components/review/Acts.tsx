import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import type { Proposal } from '@/domain/api/schemas/proposals';
import { ACT_WORDS, wantsAgreement, whyNotYet, type ReviewAct } from './words';

interface ActsProps {
  proposal: Proposal;
  me: string;
  /** Version that is judged. */
  version: number;
  pending: ReviewAct | null;
  onAgree: () => void;
  onAsk: (act: ReviewAct) => void;
}

/** Whether a person judges this proposal, however far it has got. */
export const isReviewer = ({ state, may, agreed }: Proposal, me: string) =>
  state === 'proposed' && (may.return || may.agree || agreed.some((a) => a.person.id === me));

/** The acts of a reviewer. Those that ask for something first are links to the page with their panel open. */
export function Acts({ proposal, me, version, pending, onAgree, onAsk }: ActsProps) {
  const { may, agreements, agreementsNeeded, stale } = proposal;
  const agreed = proposal.agreed.some((a) => a.person.id === me && a.stands);
  const editor = may.return;
  const asks = (act: ReviewAct, text: string, kind: 'main' | 'plain' = 'plain') => (
    <ButtonLink
      id={`ask-${act}`}
      kind={kind}
      href={`?give=${act}#give`}
      onClick={(event) => {
        event.preventDefault();
        onAsk(act);
      }}
    >
      {text}
    </ButtonLink>
  );
  return (
    <div className="review-acts">
      {may.return && asks('return', 'Return with reasons')}
      {may.decline && asks('decline', 'Decline')}
      {agreed && <p className="agreed-mark">You agreed</p>}
      {!agreed && (may.agree || stale) && (
        <form
          method="post"
          onSubmit={(event) => {
            event.preventDefault();
            if (may.agree) onAgree();
          }}
        >
          <input type="hidden" name="act" value="agree" />
          <input type="hidden" name="version" value={version} />
          <Button
            type="submit"
            kind={may.publish || !may.agree ? 'plain' : 'main'}
            disabled={!may.agree}
            aria-describedby={may.agree ? undefined : 'stale'}
            pending={pending === 'agree'}
            pendingText={ACT_WORDS.agree.doing}
          >
            Agree
          </Button>
        </form>
      )}
      {may.publish && asks('publish', 'Publish', 'main')}
      {!may.publish && editor && (
        <Button disabled aria-describedby="why-not open-questions">
          {wantsAgreement(proposal) || stale ? `Publish, ${agreements} of ${agreementsNeeded} agreed` : 'Publish'}
        </Button>
      )}
      {!may.publish && editor && !stale && whyNotYet(proposal) && (
        <p id="why-not" className="why-not">
          {whyNotYet(proposal)}
        </p>
      )}
    </div>
  );
}
