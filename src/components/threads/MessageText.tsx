import { PhotoStrip } from '@/components/photos/PhotoStrip';
import { dayOf } from '@/components/ui/day';
import type { ThreadMessage } from '@/domain/api/schemas/threads';
import { runsOf } from '@/domain/review/mentions';

/** One message: who, when, the words with the people that it names marked, and its photos. */
export const MessageText = ({ message }: { message: ThreadMessage }) => (
  <>
    <p className="thread-by">
      <b>{message.person.name}</b>, {dayOf(message.at)}
    </p>
    <p className="thread-words">
      {runsOf(message.text, message.mentions).map(({ text, person }, i) =>
        person ? (
          <b key={i} className="mention">
            {text}
          </b>
        ) : (
          text
        ),
      )}
    </p>
    <PhotoStrip photos={message.photos} />
  </>
);
