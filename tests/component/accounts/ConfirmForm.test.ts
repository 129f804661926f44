import { flushPromises, mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { ApiError } from '@/api/api-error';
import ConfirmForm from '@/components/accounts/ConfirmForm.vue';

type Confirm = InstanceType<typeof ConfirmForm>['$props']['confirm'];

function formWith(confirm: Confirm) {
  const wrapper = mount(ConfirmForm, {
    props: { confirm },
    global: { plugins: [Quasar] },
    attachTo: document.body,
  });
  async function send(password: string) {
    await wrapper.get('input').setValue(password);
    await wrapper.get('form').trigger('submit');
    await flushPromises();
  }
  return { wrapper, send };
}

afterEach(() => {
  document.body.innerHTML = '';
});

describe('the form that confirms an address', () => {
  it('when the password is given, then it is sent as typed', async () => {
    const confirm = vi.fn<Confirm>(() => Promise.resolve());
    const { wrapper, send } = formWith(confirm);
    await send('reeds and water');
    expect(confirm).toHaveBeenCalledExactlyOnceWith('reeds and water');
    expect(wrapper.findAll('input')).toHaveLength(1);
    expect(wrapper.get('[type="submit"]').text()).toBe('Confirm and sign in');
  });

  it('when nothing is given, then nothing is sent', async () => {
    const confirm = vi.fn<Confirm>();
    const { wrapper, send } = formWith(confirm);
    await send('');
    expect(confirm).not.toHaveBeenCalled();
    expect(document.activeElement).toBe(wrapper.get('input').element);
  });

  it('when it is another password, then that is told and it can be tried again', async () => {
    const refusal = new ApiError(401, 'sign-in.refused', 'These do not belong together.');
    const confirm = vi.fn<Confirm>().mockRejectedValueOnce(refusal).mockResolvedValueOnce(undefined);
    const { wrapper, send } = formWith(confirm);
    await send('not this one');
    expect(wrapper.get('[role="alert"]').text()).toBe('These do not belong together.');
    await send('reeds and water');
    expect(wrapper.get('[role="alert"]').text()).toBe('');
  });
});
