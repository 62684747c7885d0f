import { useNavigate, useSearchParams } from 'react-router-dom';
import { Mark } from '../../components/mark.js';
import { PageHeader, Panel } from '../../components/panel.js';
import { homeOf } from '../shell/rooms.js';
import { SignInForm } from '../shell/sign-in-form.js';
import { t } from '../shell/text.js';
import { useTheme } from '../shell/theme.js';
import { safeNext } from '../safe-next.js';

export function SignInPage() {
  const navigate = useNavigate();
  const [params] = useSearchParams();
  useTheme();
  return (
    <main className="lb-sign-in">
      <div className="stack">
        <div className="row">
          <Mark size={64} />
          <div>
            <b style={{ fontSize: 26 }}>Loopbay</b>
            <p className="muted">{t('signInWords')}</p>
          </div>
        </div>
        <Panel>
          <PageHeader title={t('signInTitle')} />
          <SignInForm onDone={(me) => void navigate(safeNext(params.get('next')) ?? homeOf(me), { replace: true })} />
        </Panel>
      </div>
    </main>
  );
}
