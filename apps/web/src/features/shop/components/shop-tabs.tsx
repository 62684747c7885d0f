import { NavLink } from 'react-router-dom';
import { useMe } from '../../../lib/me.js';
import { t } from '../text.js';
import './shop.css';

/** The parts of the shop this person may see. */
export function ShopTabs() {
  const { permissions } = useMe();
  const tabs = [
    { path: '/shop/limits', name: t('limits'), open: permissions.includes('limits.read') },
    { path: '/shop/people', name: t('people'), open: permissions.includes('users.manage') },
    { path: '/shop/messages', name: t('messages'), open: permissions.includes('messages.read') },
    { path: '/shop/equipment', name: t('equipment'), open: permissions.includes('instruments.read') },
    { path: '/bay/instruments', name: t('instruments'), open: permissions.includes('instruments.read') },
  ];
  return (
    <nav className="lb-shop-tabs" aria-label={t('parts')}>
      {tabs
        .filter((tab) => tab.open)
        .map((tab) => (
          <NavLink key={tab.path} to={tab.path}>
            {tab.name}
          </NavLink>
        ))}
    </nav>
  );
}
