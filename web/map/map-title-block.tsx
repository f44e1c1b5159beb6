import { titleBlockRows, type TitleBlock } from '../../shared/drawing/title-block.ts';
import { useFormats } from '../lib/place-context.ts';

/** What a drawing says of itself: case, revision, study, date, civil time, where the sun stands. */
export function MapTitleBlock({ block }: { block: TitleBlock }) {
  const { civil, figure } = useFormats();
  return (
    <table className="border-collapse border border-ink bg-sheet text-[0.75rem] leading-snug">
      <caption className="sr-only">Title block of the map</caption>
      <tbody>
        {titleBlockRows(block, civil, figure).map((row) => (
          <tr key={row.join()}>
            {row.map((text) => (
              <td key={text} className="border border-ink/60 px-2 py-0.5">
                {text}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
