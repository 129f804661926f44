import { describe, expect, it } from 'vitest';
import { faultsByField } from '@/api/faults';

describe('faultsByField', () => {
  it('when the server or a schema names a field, then the fault stands under its name', () => {
    expect(faultsByField([{ path: 'body.email', message: 'no' }], ['email'])).toEqual({
      fields: { email: 'no' },
      others: [],
    });
    expect(faultsByField([{ path: 'email', message: 'no' }], ['email']).fields).toEqual({ email: 'no' });
  });

  it('when a field has two faults, then the first is shown', () => {
    const faults = [
      { path: 'body.name', message: 'first' },
      { path: 'body.name', message: 'second' },
    ];
    expect(faultsByField(faults, ['name']).fields).toEqual({ name: 'first' });
  });

  it('when a fault lies within a field, then it is told there; another field that begins alike has none', () => {
    const faults = [{ path: 'body.anchor.chordId', message: 'no' }];
    expect(faultsByField(faults, ['anch', 'anchor']).fields).toEqual({ anchor: 'no' });
  });

  it('when a fault belongs to no field of the form, then it is told by itself', () => {
    expect(
      faultsByField([{ path: 'body.token', message: 'this link is not complete' }], ['password']),
    ).toEqual({
      fields: {},
      others: ['this link is not complete'],
    });
  });
});
