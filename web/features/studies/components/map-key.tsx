/** What the signs of a study's map mean. */
export function MapKey() {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-small" aria-label="Key of the map">
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="inline-block h-3 w-4 border border-slate bg-slate/35" />
        shadow
      </li>
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="hatched inline-block h-3 w-4 border border-madder" />
        net new shadow
      </li>
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="inline-block h-3 w-4 border-2 border-ink bg-sheet" />
        proposal
      </li>
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="font-strong text-madder">
          ✕
        </span>
        rule not met
      </li>
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="inline-block h-3 w-4 border-2 border-marigold" />
        chosen receptor
      </li>
    </ul>
  );
}
