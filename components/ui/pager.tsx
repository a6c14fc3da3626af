import { Button } from "./button";

interface Props {
  page: number;
  pageSize: number;
  total: number;
  onPage: (page: number) => void;
}

/** Which part of a long list is shown, and the way to the next. Nothing while it all fits on one page. */
export function Pager({ page, pageSize, total, onPage }: Props) {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  if (pages === 1) return null;
  const first = (page - 1) * pageSize + 1;
  return (
    <nav aria-label="Pages" className="flex items-center gap-3 py-4">
      <Button disabled={page <= 1} onClick={() => onPage(page - 1)}>
        Back
      </Button>
      <span className="measure">
        {first} to {Math.min(total, page * pageSize)} of {total}
      </span>
      <Button disabled={page >= pages} onClick={() => onPage(page + 1)}>
        Next
      </Button>
    </nav>
  );
}
