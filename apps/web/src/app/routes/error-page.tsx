import { Button } from '@blueprintjs/core';
import { isRouteErrorResponse, Link, useRouteError } from 'react-router-dom';
import { Empty, NothingHere } from '../../components/faces.js';
import { PageHeader } from '../../components/panel.js';
import { ApiError } from '../../lib/http.js';
import { t } from '../shell/text.js';

const statusOf = (error: unknown): number => (isRouteErrorResponse(error) || error instanceof ApiError || error instanceof Response ? error.status : 500);

/** A page that failed while it was loaded or shown: what happened, and the way on. */
export function ErrorPage() {
  const error = useRouteError();
  const status = statusOf(error);
  if (status === 404) return <NotFoundPage />;
  if (status === 403) return <ForbiddenPage />;
  return (
    <>
      <PageHeader title={t('failed')} />
      <Empty title={error instanceof ApiError ? error.message : t('failedWords')}>
        {error instanceof ApiError && error.requestId !== '' && <p>{t('requestNumber', { id: error.requestId })}</p>}
        <Button intent="primary" text={t('reload')} onClick={() => window.location.reload()} />
      </Empty>
    </>
  );
}

export function NotFoundPage() {
  return <NothingHere />;
}

export function ForbiddenPage() {
  return (
    <>
      <PageHeader title={t('forbidden')} />
      <Empty title={t('forbiddenWords')}>
        <Link to="/">{t('home')}</Link>
      </Empty>
    </>
  );
}
