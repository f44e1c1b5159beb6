import type { SentencePart } from '../sun-sentence.ts';

/** A sentence with its figures set strong. */
export function Sentence({ parts }: { parts: readonly SentencePart[] }) {
  return parts.map((part, index) =>
    part.isStrong === true ? (
      <strong key={index} className="whitespace-nowrap">
        {part.text}
      </strong>
    ) : (
      <span key={index}>{part.text}</span>
    ),
  );
}
