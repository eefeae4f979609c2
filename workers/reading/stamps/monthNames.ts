/** Names and usual abbreviations of the months in English, German, French, Spanish, Italian, Dutch and Portuguese, accents taken off. */
const names: readonly string[] = [
  'jan january januar janner janvier janv enero ene gennaio gen januari janeiro',
  'feb february februar fevrier fevr fev febrero febbraio februari fevereiro',
  'mar march marz maerz mrz mars marzo maart mrt marco',
  'apr april avril avr abril abr aprile',
  'may mai mayo maggio mag mei maio',
  'jun june juni juin junio giugno giu junho',
  'jul july juli juillet juil julio luglio lug julho',
  'aug august aout agosto ago augustus',
  'sep sept september septembre septiembre settembre set setembro',
  'oct october okt oktober octobre octubre ottobre ott outubro out',
  'nov november novembre noviembre novembro',
  'dec december dez dezember decembre diciembre dic dicembre dezembro',
];

const numbers = new Map(names.flatMap((line, index) => line.split(' ').map((name) => [name, index + 1] as const)));

const plain = (word: string): string => word.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();

/**
 * Number of the month a word names.
 *
 * @param word a name or abbreviation in one of seven languages, any case, with or without accents, without a full stop
 * @returns 1…12; 0 where the word names no month
 */
export function monthNumber(word: string): number {
  return numbers.get(plain(word)) ?? 0;
}
