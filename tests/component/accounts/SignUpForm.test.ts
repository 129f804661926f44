import { flushPromises, mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { ApiError, NO_ANSWER } from '@/api/api-error';
import SignUpForm from '@/components/accounts/SignUpForm.vue';

type Register = InstanceType<typeof SignUpForm>['$props']['register'];

function formWith(register: Register) {
  const wrapper = mount(SignUpForm, {
    props: { register },
    global: { plugins: [Quasar] },
    attachTo: document.body,
  });
  const field = (label: string) => {
    const named = wrapper.findAll('label').find((found) => found.text() === label);
    return wrapper.get(`[id="${named?.attributes('for')}"]`);
  };
  async function send(values: Readonly<Record<string, string>>) {
    for (const [label, value] of Object.entries(values)) await field(label).setValue(value);
    await wrapper.get('form').trigger('submit');
    await flushPromises();
  }
  const faultOf = (label: string) => {
    const described = field(label).attributes('aria-describedby');
    return described ? document.getElementById(described)?.textContent : undefined;
  };
  return { wrapper, field, send, faultOf };
}

const GOOD = { Name: 'Ada Fenn', 'E-mail': 'ada@river.example', Password: 'reeds and water' };

afterEach(() => {
  document.body.innerHTML = '';
});

describe('the sign-up form', () => {
  it('when nothing is filled in, then each field says what it needs, the first has the focus, nothing is sent', async () => {
    const register = vi.fn<Register>();
    const { send, faultOf, field } = formWith(register);
    await send({});
    expect(faultOf('Name')).toBe('please give a name');
    expect(faultOf('E-mail')).toBe('this does not look like an e-mail address');
    expect(faultOf('Password')).toBe('a password has at least 8 characters');
    expect(document.activeElement).toBe(field('Name').element);
    expect(register).not.toHaveBeenCalled();
  });

  it('when all is well, then it is sent as typed, without the space that came with the address', async () => {
    const register = vi.fn<Register>(() => Promise.resolve());
    await formWith(register).send({ ...GOOD, 'E-mail': ' ada@river.example ' });
    expect(register).toHaveBeenCalledExactlyOnceWith({
      name: 'Ada Fenn',
      email: 'ada@river.example',
      password: 'reeds and water',
      role: 'composer',
    });
  });

  it('when the server finds a fault in a field, then it stands beside that field and the rest stays', async () => {
    const faults = [{ path: 'body.password', message: 'this password is too well known' }];
    const refuse = () => Promise.reject(new ApiError(422, 'input.invalid', 'Some cannot be taken.', faults));
    const { send, faultOf, field } = formWith(refuse);
    await send(GOOD);
    expect(faultOf('Password')).toBe('this password is too well known');
    expect(document.activeElement).toBe(field('Password').element);
    expect(field('Name').element).toHaveProperty('value', 'Ada Fenn');
  });

  it('when there is no answer, then it says so and that what was typed is still there', async () => {
    const { send, wrapper } = formWith(() => Promise.reject(new ApiError(0, NO_ANSWER, 'No answer.')));
    await send(GOOD);
    expect(wrapper.get('[role="alert"]').text()).toContain('No answer. What you typed is still here');
  });

  it('when it is mended, then the fault goes', async () => {
    const { send, faultOf } = formWith(() => Promise.resolve());
    await send({ ...GOOD, Name: ' ' });
    expect(faultOf('Name')).toBe('please give a name');
    await send({ Name: 'Ada Fenn' });
    expect(faultOf('Name')).toBeUndefined();
  });
});
