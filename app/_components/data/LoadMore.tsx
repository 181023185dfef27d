"use client";

import { Button } from "../actions/Button";
import { formatCount } from "../format/number";

interface LoadMoreProps {
  /** Rows on the page now. */
  shown: number;
  noun: string;
  /** Whether there are more. */
  more: boolean;
  pending: boolean;
  onMore: () => void;
}

/** Adds the next page below the rows already there. */
export function LoadMore({ shown, noun, more, pending, onMore }: LoadMoreProps) {
  return (
    <div className="flex flex-wrap items-center gap-3 py-3 text-small">
      <span role="status" className="text-muted">
        {more ? `${formatCount(shown, noun)} shown` : `${formatCount(shown, noun)}, all shown`}
      </span>
      {more && (
        <Button size="small" pending={pending} onClick={onMore}>
          Show more
        </Button>
      )}
    </div>
  );
}
