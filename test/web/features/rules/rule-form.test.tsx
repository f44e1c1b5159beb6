import { cleanup, fireEvent, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { ruleSchema, type Rule } from '../../../../shared/rules/rule-schema.ts';
import { RuleForm } from '../../../../web/features/rules/components/rule-form.tsx';
import { draftOfRule } from '../../../../web/features/rules/rule-draft.ts';
import { ApiError } from '../../../../web/lib/api-error.ts';
import { renderInPlace, withPlainSpaces } from '../../support/render-in-place.tsx';

// A whole form with its calendar is drawn anew for each letter.
vi.setConfig({ testTimeout: 20_000 });

const noon = {
  id: 'noon',
  title: 'Noon hours',
  receptors: { classes: ['parcel'] },
  days: [{ event: 'winter-solstice' }],
  window: { basis: 'standard', from: '10:00', to: '14:00' },
  measure: { kind: 'sun-hours' },
  limit: { atLeast: 2 },
};
const spring = { ...noon, id: 'spring', title: 'Spring hours', days: [{ date: '03-21' }] };

function makeRule(clauses: object[] = [noon]): Rule {
  return ruleSchema.parse({ id: 'r', version: 1, title: 'Sun', clauses });
}

function renderForm(rule = makeRule(), error: unknown = null) {
  const onSubmit = vi.fn<(written: Rule) => void>();
  renderInPlace(
    <RuleForm
      initial={draftOfRule(rule)}
      identity={{ id: 'r', version: 2 }}
      submitLabel="Save"
      isPending={false}
      error={error}
      onSubmit={onSubmit}
      onDirtyChange={() => undefined}
    />,
  );
  return onSubmit;
}

const write = (label: string, value: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value } });
const press = (name: string) => fireEvent.click(screen.getByRole('button', { name }));
const pageText = () => withPlainSpaces(document.body.textContent);
const clauseTitles = () =>
  screen.getAllByRole('heading', { level: 3 }).map((one) => one.textContent);

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the form of a rule', () => {
  it('hands on the rule as it is written, with the number of the new version', () => {
    const onSubmit = renderForm();
    write('Title of the rule', 'More sun');
    write('At least, in h', '2.5');
    press('Save');
    const expected = makeRule([{ ...noon, limit: { atLeast: 2.5 } }]);
    expect(onSubmit).toHaveBeenCalledWith({ ...expected, title: 'More sun', version: 2 });
  });

  it('says the clause as a sentence that follows what is typed', () => {
    renderForm();
    expect(pageText()).toContain('from 10:00 to 14:00, standard time, all year');
    expect(pageText()).toContain('the rule asks for at least 2 h 00 min with the proposal.');
    write('At least, in h', '3');
    write('From', '09:30');
    expect(pageText()).toContain('from 09:30 to 14:00, standard time, all year');
    expect(pageText()).toContain('the rule asks for at least 3 h 00 min with the proposal.');
  });

  it('says at the field what is wrong while one types, and does not send it', () => {
    const onSubmit = renderForm();
    write('At least, in h', 'two');
    expect(screen.getByLabelText('At least, in h').getAttribute('aria-invalid')).toBe('true');
    expect(pageText()).toContain('Write a number.');
    write('To', '08:00');
    write('At least, in h', '2');
    expect(pageText()).toContain('The window ends before it begins.');
    press('Save');
    expect(onSubmit).not.toHaveBeenCalled();
    expect(screen.getByRole('alert').textContent).toContain(
      'Clause 1 (Noon hours), hours: The window ends before it begins.',
    );
  });

  it('tells that no sun stands in the window on its day', () => {
    renderForm();
    write('From', '02:00');
    write('To', '03:00');
    expect(pageText()).toContain('The sun does not stand in this window on 2026-12-21.');
  });

  it('does not take a clause whose clock is not chosen', () => {
    const onSubmit = renderForm();
    press('Add an empty clause');
    write('What the clause asks, as a heading', 'Another');
    expect(pageText()).toContain('Choose by which clock the hours are meant.');
    press('Save');
    expect(onSubmit).not.toHaveBeenCalled();
  });

  it('puts what the server refuses at its field until something is written anew', () => {
    const message = 'The server has something against it.';
    const error = new ApiError({
      type: 'about:blank',
      title: 'Refused',
      status: 422,
      code: 'INPUT_INVALID',
      errors: [{ path: 'rule.clauses.0.step', message }],
    });
    renderForm(makeRule(), error);
    const field = screen.getByLabelText('Minutes between instants');
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(pageText()).toContain(message);
    write('Minutes between instants', '5');
    expect(pageText()).not.toContain(message);
  });
});

describe('the clauses of the form', () => {
  it('move, double and leave, and come back where they stood', () => {
    renderForm(makeRule([noon, spring]));
    expect(clauseTitles()).toEqual(['1. Noon hours', '2. Spring hours']);
    press('Move clause 2 up');
    expect(clauseTitles()).toEqual(['1. Spring hours', '2. Noon hours']);
    press('Duplicate clause 1');
    expect(clauseTitles()).toEqual(['1. Spring hours', '2. Spring hours (copy)', '3. Noon hours']);
    press('Remove clause 1');
    expect(clauseTitles()).toEqual(['1. Spring hours (copy)', '2. Noon hours']);
    press('Put it back');
    expect(clauseTitles()).toEqual(['1. Spring hours', '2. Spring hours (copy)', '3. Noon hours']);
  });

  it('get ids of their own when they are doubled', () => {
    const onSubmit = renderForm();
    press('Duplicate clause 1');
    press('Save');
    expect(onSubmit.mock.calls[0]?.[0].clauses.map(({ id }) => id)).toEqual(['noon', 'noon-2']);
  });

  it('come from a template with its source, found by words', () => {
    // jsdom has no CSS object, which the dialog asks to escape a name.
    vi.stubGlobal('CSS', { escape: (text: string) => text });
    const onSubmit = renderForm();
    press('Add from a template');
    const dialog = screen.getByRole('dialog');
    fireEvent.change(within(dialog).getByRole('textbox'), { target: { value: 'BR 209' } });
    expect(within(dialog).getAllByRole('heading', { level: 3 }).length).toBeGreaterThan(0);
    const add = within(dialog).getByRole('button', { name: /^Add: Two hours of sun on half/ });
    fireEvent.click(add);
    expect(clauseTitles()[1]).toContain('2. Two hours of sun on half');
    expect(pageText()).toContain('From: BRE, Site layout planning');
    press('Save');
    expect(onSubmit.mock.calls[0]?.[0].clauses[1]).toMatchObject({
      measure: { kind: 'sun-share', hours: 2 },
      limit: { anyOf: [{ atLeast: 0.5 }, { keeps: 0.8 }] },
      minimumAltitude: 10,
    });
  });
});

describe('the rule as data', () => {
  const asData = () => screen.getByLabelText<HTMLTextAreaElement>('The rule as data');

  it('follows the form, and takes its place once it is asked to', () => {
    const onSubmit = renderForm();
    write('Title of the rule', 'Other');
    expect(JSON.parse(asData().value)).toMatchObject({ title: 'Other', version: 2 });
    write('The rule as data', JSON.stringify(makeRule([{ ...spring, step: 5 }])));
    press('Take this over into the form');
    expect(clauseTitles()).toEqual(['1. Spring hours']);
    press('Save');
    expect(onSubmit.mock.calls[0]?.[0].clauses[0]).toMatchObject({ id: 'spring', step: 5 });
  });

  it.each([
    ['{', 'This is no JSON object.'],
    [JSON.stringify({ title: 'x', clauses: [{ ...noon, step: 0 }] }), 'clauses.0.step'],
  ])('is not taken where it is wrong, and says where: %s', (text, words) => {
    renderForm();
    write('The rule as data', text);
    press('Take this over into the form');
    expect(screen.getByRole('alert').textContent).toContain(words);
    expect(clauseTitles()).toEqual(['1. Noon hours']);
  });
});
