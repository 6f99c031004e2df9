import { Skeleton, SkeletonItem } from '@fluentui/react-components';
import './feedback.css';

/** Keeps the place of rows that are on their way, so that nothing jumps. */
export function LoadingRows({ rows = 5, label = 'Loading' }: { rows?: number; label?: string }) {
  return (
    <Skeleton aria-label={label} className="skeleton-rows">
      {Array.from({ length: rows }, (_, row) => (
        <div key={row}>
          <SkeletonItem size={16} className="wide" />
          <SkeletonItem size={16} className="narrow" />
        </div>
      ))}
    </Skeleton>
  );
}

/** Keeps the place of a map or chart. */
export function LoadingFigure({ height = 240, label = 'Loading' }: { height?: number; label?: string }) {
  return (
    <Skeleton aria-label={label}>
      <SkeletonItem shape="rectangle" style={{ height }} />
    </Skeleton>
  );
}
