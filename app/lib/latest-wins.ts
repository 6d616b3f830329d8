/**
 * Keeps one question on its way at a time, and of those that come meanwhile only the latest: an answer to anything else is dropped.
 * @param send takes a question; its answer is brought back by `answered`
 */
export function latestWins<Question extends { key: string }>(send: (question: Question) => void) {
  let sent: Question | null = null;
  let next: Question | null = null;
  let wanted: string | null = null;
  return {
    ask(question: Question): void {
      wanted = question.key;
      if (sent) {
        next = question;
        return;
      }
      sent = question;
      send(question);
    },
    /** Nothing is wanted any more. */
    forget(): void {
      wanted = null;
      next = null;
    },
    /** Tells whether the answer is the one that is wanted, and sends the question that has waited. */
    answered(key: string): boolean {
      sent = null;
      if (next) {
        sent = next;
        next = null;
        send(sent);
      }
      return key === wanted;
    },
  };
}
