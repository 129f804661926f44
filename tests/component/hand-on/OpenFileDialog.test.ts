import { flushPromises, mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { describe, expect, it } from 'vitest';
import OpenFileDialog from '@/components/hand-on/OpenFileDialog.vue';
import { studyFileText } from '@/export/study-file';
import { documentOf } from '../../support/studies';

const DialogFrame = { template: '<div><slot /></div>' };

async function dialogWith(text: string, mayOwn: boolean) {
  const wrapper = mount(OpenFileDialog, {
    props: { modelValue: true, mayOwn, draftInUse: false, trouble: null, busy: false },
    global: { plugins: [Quasar], stubs: { DialogFrame } },
  });
  const field = wrapper.get<HTMLInputElement>('input[type="file"]');
  const file = new File([text], 'study.siltline.json', { type: 'application/json' });
  Object.defineProperty(field.element, 'files', { value: [file] });
  await field.trigger('change');
  await flushPromises();
  return wrapper;
}

describe('opening a study from a file', () => {
  const study = documentOf('The ferry at dusk', ['chord-1', 'chord-2']);

  it('when the file is whole, then it is told what it holds, and it becomes the draft or a new study', async () => {
    const wrapper = await dialogWith(studyFileText(study), true);
    expect(wrapper.text()).toContain('The ferry at dusk, 2 chords');
    const [asStudy, asDraft] = wrapper.findAll('button');
    await asStudy?.trigger('click');
    await asDraft?.trigger('click');
    expect(wrapper.emitted('create')).toEqual([[study]]);
    expect(wrapper.emitted('draft')).toEqual([[study]]);
  });

  it('when a visitor opens it, then it can only be the draft', async () => {
    const wrapper = await dialogWith(studyFileText(study), false);
    expect(wrapper.findAll('button').map((button) => button.text())).toEqual(['As the draft']);
  });

  it('when the file is none of ours, then that is said and nothing can be opened', async () => {
    const wrapper = await dialogWith('{"a": 1}', true);
    expect(wrapper.get('[role="alert"]').text()).toContain('no schemaVersion 1');
    expect(wrapper.findAll('button')).toHaveLength(0);
  });
});
