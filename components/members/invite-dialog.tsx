'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm, useWatch } from 'react-hook-form';
import { applyProblem } from '@/components/forms/apply-problem';
import { ROLE_DEEDS, ROLE_NAMES, ROLES_IN_ORDER } from '@/components/shell/role-words';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import { toast } from '@/components/ui/toaster';
import { useMemberActions } from '@/lib/client/use-members';
import { invitationRequestSchema } from '@/lib/contracts/accounts';
import { ProjectPicker } from './project-picker';

/** Invites somebody by e-mail: as what, and a viewer to which projects. Mount it to open it. */
export function InviteDialog({ onClose }: { onClose: () => void }) {
  const { invite } = useMemberActions();
  const form = useForm({
    resolver: zodResolver(invitationRequestSchema),
    defaultValues: { email: '', role: 'planner', projectIds: [] },
  });
  const { errors, isSubmitting } = form.formState;
  const role = useWatch({ control: form.control, name: 'role' });
  const submit = form.handleSubmit(async (request) => {
    try {
      // Ticks made before another role was chosen mean nothing for it.
      await invite({ ...request, projectIds: request.role === 'viewer' ? request.projectIds : [] });
      toast.success(`The invitation to ${request.email} is on its way`);
      onClose();
    } catch (error) {
      applyProblem(form, error);
    }
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Invite somebody"
      footer={
        <>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
          <Button type="submit" form="invite-form" variant="action" busy={isSubmitting} busyLabel="Sending…">
            Send the invitation
          </Button>
        </>
      }
    >
      <form id="invite-form" onSubmit={submit} noValidate className="flex flex-col gap-4">
        {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
        <Field label="E-mail" error={errors.email?.message} required>
          <TextInput type="email" inputMode="email" autoComplete="off" {...form.register('email')} />
        </Field>
        <Field
          label="Role"
          hint={`A ${ROLE_NAMES[role].toLowerCase()} ${ROLE_DEEDS[role]}`}
          error={errors.role?.message}
        >
          <Controller
            control={form.control}
            name="role"
            render={({ field }) => (
              <Select
                value={field.value}
                onValueChange={field.onChange}
                options={ROLES_IN_ORDER.map((value) => ({ value, label: ROLE_NAMES[value] }))}
              />
            )}
          />
        </Field>
        {role === 'viewer' && (
          <Controller
            control={form.control}
            name="projectIds"
            render={({ field }) => (
              <ProjectPicker chosen={field.value ?? []} onChange={field.onChange} error={errors.projectIds?.message} />
            )}
          />
        )}
      </form>
    </Dialog>
  );
}
