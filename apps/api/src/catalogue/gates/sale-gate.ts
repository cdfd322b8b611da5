import { open, passed, type GateCheck } from './gate-facts.js';

export const licenceAndPrice: GateCheck = ({ licences }) => {
  const name = 'licence-and-price';
  const offered = licences.filter((licence) => licence.isOffered);
  if (offered.length === 0) return open(name, 'No licence is offered. Add one with its terms and its price.');
  if (offered.some((licence) => licence.terms.trim() === ''))
    return open(name, 'A licence has no terms. Say what it allows.');
  return passed(
    name,
    `${offered.length === 1 ? 'One licence is' : `${offered.length} licences are`} offered.`,
  );
};
