import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { Mark } from '../../../components/mark.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { checkQuery } from '../../../features/check/api/check-queries.js';
import { CheckAnswer } from '../../../features/check/components/check-answer.js';
import { CodeForm } from '../../../features/check/components/code-form.js';
import { readCode } from '../../../features/check/code-form.js';
import { t } from '../../../features/check/text.js';
import { useTheme } from '../../shell/theme.js';
import './check.css';

/** Open to anybody who holds a certificate: no sign-in, nothing but what is needed to trust the paper. */
export function CheckPage() {
  const { code } = useParams();
  useTheme();
  return (
    <main className="lb-check-page">
      <div className="stack">
        <div className="row">
          <Mark size={44} />
          <b className="lb-check-brand">Loopbay</b>
        </div>
        <Panel>
          <PageHeader title={t('title')} />
          {code === undefined ? <Ask /> : <Checked key={code} typed={code} />}
        </Panel>
      </div>
    </main>
  );
}

function Ask({ start = '' }: { readonly start?: string }) {
  const navigate = useNavigate();
  return (
    <div className="stack">
      <p className="muted">{t('words')}</p>
      <CodeForm start={start} onCode={(code) => void navigate(`/check/${encodeURIComponent(code)}`)} />
    </div>
  );
}

function Checked({ typed }: { readonly typed: string }) {
  const code = readCode(typed);
  const answer = useQuery({ ...checkQuery(code ?? ''), enabled: code !== null });
  if (code === null) {
    return (
      <div className="stack">
        <p role="alert">{t('shape')}</p>
        <Ask start={typed} />
      </div>
    );
  }
  return (
    <div className="stack">
      <Answer query={answer}>{(data) => <CheckAnswer code={code} answer={data} />}</Answer>
      <Link to="/check">{t('another')}</Link>
    </div>
  );
}
