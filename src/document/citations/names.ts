/** Names of authors, as far as both styles need them. */

import type { Reference } from '../../spec/study.ts';

export interface Name {
  /** Family name with its particle, or the name of a group. */
  family: string;
  /** First letters of the given names: 'F', 'J-P'. */
  initials: string[];
  /** What follows the initials, such as 'van' of a dropped particle. */
  particle: string;
  /** Such as 'Jr.' */
  generation: string;
}

/** Particles that stand behind the initials when a source puts them into the given names. */
const PARTICLES = /^(?:da|de|del|della|den|der|di|dos|du|la|le|te|ten|ter|van|von|zu|zum|zur)$/;

/** In the order of the publication; entries without any name are left out. */
export function namesOf({ author = [] }: Reference): Name[] {
  return author.flatMap(({ family, given, literal }) => {
    const name = [literal, family, given].find((part) => part !== undefined && part.trim() !== '')?.trim();
    if (name === undefined) return [];
    const isWhole = name === literal?.trim() || name === given?.trim();
    return [isWhole ? wholeName(name) : { ...wholeName(name), ...givenNames(given ?? '') }];
  });
}

function wholeName(family: string): Name {
  return { family, initials: [], particle: '', generation: '' };
}

function givenNames(given: string): Omit<Name, 'family'> {
  const [names = '', ...generation] = given.split(/,\s*/);
  const words = names.split(/\s+/).filter((word) => word !== '');
  return {
    initials: words.filter((word) => !PARTICLES.test(word)).flatMap(initialsOf),
    particle: words.filter((word) => PARTICLES.test(word)).join(' '),
    generation: generation.join(', ').trim(),
  };
}

/** 'Jean-Paul' → J-P; 'J.A.' and 'JA' → J, A; 'Mary' → M. */
function initialsOf(word: string): string[] {
  const parts = /^\p{Lu}{2,3}$/u.test(word) ? [...word] : word.split('.').filter((part) => part !== '');
  return parts
    .map((part) =>
      part
        .split(/[-‐]/)
        .map((piece) => /\p{L}\p{M}*/u.exec(piece)?.[0].toUpperCase() ?? '')
        .filter((letter) => letter !== '')
        .join('-'),
    )
    .filter((initial) => initial !== '');
}
