/** Answers to the newest of many questions. */
export interface LatestWins<Question> {
  want: (question: Question) => void;
  close: () => void;
}

export interface LatestWinsOptions<Question, Answer> {
  ask: (question: Question) => Promise<Answer>;
  onAnswer: (answer: Answer, question: Question) => void;
  onError: (error: unknown, question: Question) => void;
}

/**
 * Asks one question at a time. Of those that come meanwhile only the newest is kept, and every
 * answer is shown, so that dragging neither piles up work nor stands still.
 */
export function createLatestWins<Question, Answer>({
  ask,
  onAnswer,
  onError,
}: LatestWinsOptions<Question, Answer>): LatestWins<Question> {
  let next: { question: Question } | null = null;
  let isBusy = false;
  let isClosed = false;

  const work = async () => {
    isBusy = true;
    while (next !== null) {
      const { question } = next;
      next = null;
      try {
        const answer = await ask(question);
        if (!isClosed) onAnswer(answer, question);
      } catch (error) {
        if (!isClosed) onError(error, question);
      }
    }
    isBusy = false;
  };
  return {
    want: (question) => {
      if (isClosed) return;
      next = { question };
      if (!isBusy) void work();
    },
    close: () => {
      isClosed = true;
      next = null;
    },
  };
}
