import { useEffect, useRef } from 'react';
import { NavLink, Outlet, ScrollRestoration, useLocation } from 'react-router-dom';
import { Mark } from '../../components/mark.js';
import { UnitsProvider } from '../../components/units.js';
import { useMe } from '../../lib/me.js';
import { AccountMenu } from './account-menu.js';
import { ConnectionBanner } from './connection-banner.js';
import { ForbiddenPage } from '../routes/error-page.js';
import { homeOf, isOpenTo, roomsOf } from './rooms.js';
import { isTyping } from './scanner.js';
import { SearchBox } from './search-box.js';
import { SignInAgain } from './sign-in-again.js';
import { t } from './text.js';
import { useTheme } from './theme.js';
import './shell.css';

/** A new page begins where it begins for the eye too: the focus goes to its content, unless the page has put it into a field. */
function useFocusOnNewPage() {
  const content = useRef<HTMLElement>(null);
  const { pathname } = useLocation();
  const seen = useRef(pathname);
  useEffect(() => {
    if (seen.current === pathname) return;
    seen.current = pathname;
    if (isTyping(document.activeElement) && content.current?.contains(document.activeElement)) return;
    content.current?.focus({ preventScroll: true });
  }, [pathname]);
  return content;
}

/** Header with the rooms, and the open page below it. */
export function Shell() {
  const me = useMe();
  const customer = me.roles.includes('customer');
  useTheme(me.preferences.theme);
  const content = useFocusOnNewPage();
  const { pathname } = useLocation();
  return (
    <UnitsProvider value={me.preferences.units}>
      <div className={`lb-shell${customer ? ' lb-shell-portal' : ''}`}>
        <a className="lb-skip" href="#content">
          {t('skip')}
        </a>
        <header className="lb-header no-print">
          <NavLink to={homeOf(me)} className="lb-brand">
            <Mark size={38} />
            <span>Loopbay</span>
          </NavLink>
          <nav aria-label={t('rooms')}>
            {roomsOf(me).map((room) => (
              <NavLink key={room.path} to={room.path} end={room.path === '/portal'}>
                {room.name}
              </NavLink>
            ))}
          </nav>
          <div className="lb-header-end">
            {!customer && <SearchBox />}
            <AccountMenu />
          </div>
        </header>
        <ConnectionBanner />
        <main id="content" tabIndex={-1} ref={content}>
          {isOpenTo(me, pathname) ? <Outlet /> : <ForbiddenPage />}
        </main>
        <SignInAgain />
        <ScrollRestoration />
      </div>
    </UnitsProvider>
  );
}
