// What is shown beside an offer once a person looks at it: the card of a catalogue substance, or what the hover would say of
// a definition, value or figure. Shows what was worked out and works nothing out itself.
import { findSubstance, phasesOfSubstance } from '../core/substance/catalogue.ts';
import { cardOfSubstance } from '../scenario/material-card.ts';
import type { EvaluatedScenario, Place } from '../scenario/scenario.ts';
import type { CompletionSubject, Documentation } from './completion-item.ts';
import { hoverCard } from './hover-card.ts';
import { hoverDefinition } from './hover-definition.ts';
import { hoverFigure } from './hover-figure.ts';
import { hoverValue } from './hover-quantity.ts';
import { tellPlace } from './tell-place.ts';

/** null when it is gone: the text may have changed since the offer was made. */
export function completionDocumentation(
  scenario: EvaluatedScenario,
  path: string,
  subject: CompletionSubject,
): Documentation | null {
  const nowhere: Place = { path, start: 0, end: 0 };
  if (subject.kind === 'catalogue') {
    const phases = phasesOfSubstance(subject.name);
    const substance = phases.find(({ phase }) => phase === subject.phase) ?? findSubstance(subject.name);
    return substance ? hoverCard(nowhere, cardOfSubstance(substance)) : null;
  }
  const name = subject.kind === 'name' ? subject.name : subject.of;
  const definition = scenario.files.flatMap(({ definitions }) => definitions).find((one) => one.name === name);
  if (subject.kind === 'figure') {
    const figure = definition?.figures.find(({ id }) => id === subject.id);
    return figure ? hoverFigure(nowhere, name, figure, tellPlace(scenario, path)) : null;
  }
  if (definition) return hoverDefinition(nowhere, definition);
  for (const file of scenario.files) {
    const value = file.values.find((one) => one.name === name);
    if (value) return hoverValue(nowhere, value, file);
  }
  return null;
}
