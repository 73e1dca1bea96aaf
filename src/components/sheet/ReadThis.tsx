import { Button } from '@/components/ui/Button';

/** Signs a bulletin as read. A plain form; `back` is the page it was read on. */
export const ReadThis = ({ bulletin, back, about }: { bulletin: string; back: string; about: string }) => (
  <form method="post" action="/bulletins">
    <input type="hidden" name="bulletin" value={bulletin} />
    <input type="hidden" name="back" value={back} />
    <Button type="submit" kind="main">
      <span>
        I have read this<span className="sr-only">: {about}</span>
      </span>
    </Button>
  </form>
);
