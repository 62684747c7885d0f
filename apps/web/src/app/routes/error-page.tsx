import { Button } from '@blueprintjs/core';
import { isRouteErrorResponse, Link, useRouteError } from 'react-router-dom';
import { ApiError } from '../../lib/http.js';
import { Empty } from '../../components/faces.js';
import { t } from '../shell/text.js';

/** A page that is not there, or that failed while it was shown. */
export function ErrorPage() {
  const error = useRouteError();
  const missing = (isRouteErrorResponse(error) && error.status === 404) || (error instanceof ApiError && error.status === 404);
  if (missing) {
    return (
      <Empty title={t('notFound')}>
        <p>{t('notFoundWords')}</p>
        <p>
          <Link to="/">{t('home')}</Link>
        </p>
      </Empty>
    );
  }
  return (
    <Empty title={t('failed')}>
      <p>{error instanceof ApiError ? error.message : t('failedWords')}</p>
      <Button text={t('reload')} onClick={() => window.location.reload()} />
    </Empty>
  );
}

export function NotFoundPage(): never {
  throw new Response('', { status: 404 });
}
