import { InputGroup } from '@blueprintjs/core';
import { Search } from '@blueprintjs/icons';
import { useEffect, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { t } from '../text.js';
import './customers.css';

/** What is looked for stands in the address, a moment after it is typed. */
export function FindBox() {
  const [params, setParams] = useSearchParams();
  const asked = params.get('q') ?? '';
  const [typed, setTyped] = useState(asked);
  useEffect(() => {
    if (typed.trim() === asked) return;
    const later = setTimeout(() => setParams(typed.trim() === '' ? {} : { q: typed.trim() }, { replace: true }), 250);
    return () => clearTimeout(later);
  }, [typed, asked, setParams]);
  return <InputGroup className="lb-find" type="search" leftElement={<span className="lb-find-icon"><Search /></span>} value={typed} onChange={(e) => setTyped(e.target.value)} placeholder={t('find')} aria-label={t('findLabel')} />;
}
