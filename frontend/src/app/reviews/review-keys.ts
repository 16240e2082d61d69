/** What a key does on the review page. */
export type ReviewAction =
  'next' | 'previous' | 'remark' | 'photo' | 'approve' | 'sendBack' | 'queueNext' | 'help';

/** All keys with what they do, in the order in which the help names them. */
export const REVIEW_KEYS: readonly { readonly keys: readonly string[]; readonly action: ReviewAction }[] = [
  { keys: ['ArrowDown', 'j'], action: 'next' },
  { keys: ['ArrowUp', 'k'], action: 'previous' },
  { keys: ['r'], action: 'remark' },
  { keys: ['f'], action: 'photo' },
  { keys: ['a'], action: 'approve' },
  { keys: ['s'], action: 'sendBack' },
  { keys: ['n'], action: 'queueNext' },
  { keys: ['?'], action: 'help' },
];

type Pressed = Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'altKey' | 'target'>;

/** What a key press asks for; nothing while somebody types, or with a modifier that belongs to the browser. */
export function reviewAction(event: Pressed): ReviewAction | null {
  if (event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target)) return null;
  return REVIEW_KEYS.find(({ keys }) => keys.includes(event.key))?.action ?? null;
}

/** Where letters are text, or choose an option; buttons, check boxes, summaries and drawings take none. */
const TEXT_BOXES =
  'textarea, select, input:not([type=checkbox], [type=radio], [type=button], [type=submit], [type=file])';

function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || target.closest(`${TEXT_BOXES}, [role="dialog"]`) !== null)
  );
}
