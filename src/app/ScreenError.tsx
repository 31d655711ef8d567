import { useRouteError } from 'react-router-dom';
import { ErrorState } from '#src/components/states.tsx';

/** A screen that could not be shown; the frame around it stays. */
export function ScreenError() {
  const error = useRouteError();
  return <ErrorState error={error} onRetry={() => window.location.reload()} />;
}
