/** What a key does on the review page. */
export type ReviewAction = 'next' | 'previous' | 'remark' | 'photo' | 'approve' | 'sendBack' | 'help';

/** All keys with what they do, in the order in which the help names them. */
export const REVIEW_KEYS: readonly { readonly keys: readonly string[]; readonly action: ReviewAction }[] = [
  { keys: ['ArrowDown', 'j'], action: 'next' },
  { keys: ['ArrowUp', 'k'], action: 'previous' },
  { keys: ['r'], action: 'remark' },
  { keys: ['f'], action: 'photo' },
  { keys: ['a'], action: 'approve' },
  { keys: ['s'], action: 'sendBack' },
  { keys: ['?'], action: 'help' },
];

type Pressed = Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'altKey' | 'target'>;

/** What a key press asks for; nothing while somebody types, or with a modifier that belongs to the browser. */
export function reviewAction(event: Pressed): ReviewAction | null {
  if (event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target)) return null;
  return REVIEW_KEYS.find(({ keys }) => keys.includes(event.key))?.action ?? null;
}

function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable ||
      target.closest('input, textarea, select, summary, canvas, [role="dialog"]') !== null)
  );
}
