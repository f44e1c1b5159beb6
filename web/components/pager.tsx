import { Button } from './button.tsx';

export interface PagerProps {
  page: number;
  pageSize: number;
  total: number;
  onPage: (page: number) => void;
}

/** Moves through a long list; absent where everything fits on one page. */
export function Pager({ page, pageSize, total, onPage }: PagerProps) {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  if (pages === 1) return null;
  return (
    <nav aria-label="Pages of the list" className="flex items-baseline gap-4 py-2 text-small">
      <Button kind="plain" isDisabled={page <= 1} onPress={() => onPage(page - 1)}>
        Earlier rows
      </Button>
      <span>
        Page {page} of {pages}, {total} rows
      </span>
      <Button kind="plain" isDisabled={page >= pages} onPress={() => onPage(page + 1)}>
        Further rows
      </Button>
    </nav>
  );
}
