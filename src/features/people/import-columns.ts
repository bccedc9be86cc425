import { type Language, languageNames } from '../../i18n/languages.ts';
import { foldWords } from '../../lib/messages/index.ts';
import { type PersonKind, type PersonRole, personRoles } from './person.ts';

export const importColumns = ['name', 'phone', 'mail', 'language', 'roles', 'days', 'from', 'to'] as const;
export type ImportColumn = (typeof importColumns)[number];

/** What a first row may call its columns, folded: whoever keeps the list keeps it in their own language. */
const columnWords: Readonly<Record<ImportColumn, readonly string[]>> = {
  name: ['name', 'full name', 'nombre', 'imie i nazwisko', 'nazwisko', 'nazwa', 'ten', 'ho ten', 'ho va ten'],
  phone: [
    'phone',
    'mobile',
    'number',
    'telefono',
    'movil',
    'celular',
    'telefon',
    'numer',
    'dien thoai',
    'so',
  ],
  mail: [
    'mail',
    'email',
    'e mail',
    'correo',
    'poczta',
    'adres mailowy',
    'thu',
    'dia chi thu',
    'dia chi email',
  ],
  language: ['language', 'idioma', 'lengua', 'jezyk', 'ngon ngu', 'tieng'],
  roles: ['roles', 'role', 'funciones', 'funcion', 'role w zakladzie', 'rola', 'vai tro'],
  days: ['days', 'dias', 'dni', 'ngay'],
  from: ['from', 'desde', 'od', 'tu'],
  to: ['to', 'hasta', 'do', 'den'],
};

const roleWords: Readonly<Record<PersonRole, readonly string[]>> = {
  operator: ['operator', 'operario', 'operaria', 'operador', 'operadora', 'nguoi van hanh', 'van hanh'],
  supervisor: [
    'supervisor',
    'supervisora',
    'encargado',
    'brygadzista',
    'kierownik zmiany',
    'truong ca',
    'to truong',
  ],
  engineer: ['engineer', 'ingeniero', 'ingeniera', 'inzynier', 'technolog', 'ky su'],
  admin: ['admin', 'administrator', 'administrador', 'administradora', 'quan tri', 'quan tri vien'],
};

const linePhoneWords = [
  'line phone',
  'telefono de linea',
  'telefon linii',
  'dien thoai day chuyen',
  'dien thoai chuyen',
];

/** Which column a heading names; undefined for one that is not asked for. */
export function readHeading(cell: string): ImportColumn | undefined {
  const words = foldWords(cell);
  return importColumns.find((column) => columnWords[column].includes(words));
}

/** A language by its code or its own name; undefined for one that the product does not speak. */
export function readLanguage(cell: string): Language | undefined {
  const words = foldWords(cell);
  const known = Object.keys(languageNames) as Language[];
  return known.find((code) => code === words || foldWords(languageNames[code]) === words);
}

/** Roles with commas, slashes or "and" signs between them. @returns undefined when one of them is none */
export function readRoles(cell: string): { kind: PersonKind; roles: PersonRole[] } | undefined {
  const parts = cell
    .split(/[,;/|+&]/)
    .map(foldWords)
    .filter((part) => part !== '');
  if (parts.length === 1 && linePhoneWords.includes(parts[0] ?? ''))
    return { kind: 'line phone', roles: ['operator'] };
  const roles = parts.map((part) => personRoles.find((role) => roleWords[role].includes(part)));
  if (roles.length === 0 || roles.includes(undefined)) return undefined;
  return { kind: 'person', roles: roles.filter((role) => role !== undefined) };
}

/** Days as `1-5` or `1,2,6`, Monday being 1. @returns undefined where it is neither */
export function readDays(cell: string): number[] | undefined {
  const days: number[] = [];
  for (const part of cell.split(/[,\s]+/).filter((piece) => piece !== '')) {
    const found = /^([1-7])(?:\s*[-\u2013]\s*([1-7]))?$/.exec(part);
    if (!found) return undefined;
    const first = Number(found[1]);
    const last = Number(found[2] ?? found[1]);
    if (last < first) return undefined;
    for (let day = first; day <= last; day += 1) days.push(day);
  }
  return days.length === 0 ? undefined : [...new Set(days)].sort((a, b) => a - b);
}
