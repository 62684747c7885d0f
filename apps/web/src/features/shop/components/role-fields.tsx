import { STAFF_ROLES } from '@shared/roles';
import { useFormState, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { CheckField } from '../../../components/fields.js';
import { t } from '../text.js';
import { roleName } from '../user-form.js';
import './shop.css';

/** The roles somebody of the shop may have, each a tick. */
export function RoleFields<F extends FieldValues>({ control }: { readonly control: Control<F> }) {
  const { errors } = useFormState({ control });
  const problem = (errors['roles'] as { readonly message?: string } | undefined)?.message;
  return (
    <fieldset className="lb-roles" aria-describedby="roles-help">
      <legend>{t('roles')}</legend>
      <div className="row">
        {STAFF_ROLES.map((role) => (
          <CheckField key={role} control={control} name={`roles.${role}` as FieldPath<F>} label={roleName(role)} />
        ))}
      </div>
      <div id="roles-help" className={problem ? 'lb-problem' : 'lb-help'} role={problem ? 'alert' : undefined}>
        {problem ?? t('rolesHelp')}
      </div>
    </fieldset>
  );
}
