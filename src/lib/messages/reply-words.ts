import type { ReplyIntent } from './reply.ts';

/**
 * The words a text may begin with and what they mean: all four languages at once, lower case, without marks. The first
 * of each language is the one that the texts and the poster teach.
 */
export const commandWords: Readonly<Partial<Record<ReplyIntent, readonly string[]>>> = {
  danger: [
    ...['danger', 'dangerous'],
    ...['peligro', 'peligroso', 'peligrosa'],
    ...['niebezpieczenstwo', 'niebezpiecznie', 'niebezpieczne', 'zagrozenie'],
    'nguy hiem',
  ],
  skip: [
    ...['skip', 'skip it'],
    ...['saltar', 'salto', 'saltear', 'omitir'],
    ...['pomin', 'pominac', 'pomijam', 'pomin to'],
    ...['bo qua', 'bo luot'],
  ],
  later: [
    ...['later', 'not now', 'not yet'],
    ...['luego', 'mas tarde', 'despues', 'ahora no'],
    ...['pozniej', 'nie teraz', 'potem'],
    ...['sau', 'de sau', 'lat nua', 'chua duoc'],
  ],
  problem: [
    ...['problem', 'problems', 'there is a problem', 'we have a problem', 'i have a problem', 'a problem'],
    ...['problema', 'problemas', 'hay un problema', 'tengo un problema', 'tenemos un problema'],
    ...['mam problem', 'jest problem', 'mamy problem', 'problemy', 'awaria'],
    ...['su co', 'co su co', 'truc trac', 'bi truc trac'],
  ],
  done: [
    ...['done', 'made', 'finished', 'all done', 'is done'],
    ...['hecho', 'hecha', 'listo', 'lista', 'terminado', 'ya esta'],
    ...['gotowe', 'zrobione', 'gotowy', 'gotowa', 'zrobiony', 'zrobilem', 'zrobilam', 'skonczone'],
    ...['xong', 'xong roi', 'da xong', 'lam xong', 'da lam xong'],
  ],
  fix: [
    ...['fix', 'correction'],
    ...['corregir', 'corrige', 'correccion', 'corrijo'],
    ...['popraw', 'poprawka', 'poprawiam', 'poprawic'],
    ...['sua', 'sua lai'],
  ],
  cannot: [
    ...['cant', 'cannot', 'i cant', 'we cant', 'can t reach', 'i cannot'],
    ...['no puedo', 'no se puede', 'no podemos', 'no llega', 'no llego'],
    ...['nie moge', 'nie da sie', 'nie mozna', 'nie dam rady', 'nie mozemy', 'nie osiaga'],
    ...['khong duoc', 'khong the', 'khong dat', 'khong chinh duoc'],
  ],
  newBatch: [
    ...['new batch', 'new lot'],
    ...['lote nuevo', 'nuevo lote'],
    ...['nowa partia', 'nowa seria'],
    ...['lo moi', 'me moi'],
  ],
  link: ['link', 'enlace', 'odnosnik', 'lien ket', 'new link', 'link please'],
  help: ['help', 'info', 'ayuda', 'pomoc', 'pomocy', 'tro giup', 'giup', 'giup toi'],
  yes: [
    ...['ok', 'okay', 'yes', 'yep', 'yeah', 'right', 'correct', 'that is right', 'that s right', 'go'],
    ...['si', 'vale', 'correcto', 'es correcto', 'asi es', 'esta bien', 'okey'],
    ...['tak', 'zgadza sie', 'dobrze', 'okej', 'oki', 'tak jest'],
    ...['dung', 'dung roi', 'dung vay', 'phai', 'vang', 'duoc', 'dong y'],
  ],
  no: [
    ...['no', 'nope', 'wrong', 'not right', 'incorrect'],
    ...['incorrecto', 'no es correcto', 'esta mal'],
    ...['nie', 'zle', 'nie zgadza sie', 'niedobrze'],
    ...['khong', 'sai', 'sai roi', 'khong phai', 'khong dung'],
  ],
};

/** Unmarked Vietnamese words that mean something else in Polish ("co" asks "what?", "da" is "will give"). */
export const yesInVietnamese: readonly string[] = ['co', 'da'];
export const markedVietnameseYes: ReadonlySet<string> = new Set(['có', 'dạ']);

/** What stands before the number of a run. */
export const runWords: readonly string[] = [
  ...['run', 'r', 'for run', 'test'],
  ...['corrida', 'prueba', 'la corrida'],
  ...['przebieg', 'proba', 'przebiegu', 'probie'],
  ...['luot', 'lan', 'luot chay'],
];

/** Words that add nothing: a reading or a command means the same with or without them. */
export const fillerWords: ReadonlySet<string> = new Set(
  [
    'the a it is its it s that this one i we got get was were all with for now here please pls thanks thank you thx hi',
    'hello sorry and then ok okay so result results reading readings value values number numbers part parts making run',
    'right yes ty sir boss done made',
    'el la los las es son fue y gracias por favor hola ya todo todos listo resultado resultados lectura lecturas valor',
    'valores pieza piezas numero numeros bien perdon si hecho',
    'to jest sa i oraz dzieki dziekuje prosze czesc wynik wyniki odczyt odczyty wartosc sztuka sztuki tak juz wszystko',
    'sorki gotowe zrobione',
    'va la cam on xin nhe a roi da ket qua so do day xong vang duoc',
  ].flatMap((line) => line.split(' ')),
);

/** Units that people write after a number. The trial's own unit comes with the question. */
export const usualUnits: ReadonlySet<string> = new Set(
  [
    'n nm kn mm cm m um g kg mg lb lbs oz c f k bar mbar psi kpa mpa pa s sec secs sek seg ms min mins h hr v mv kv a ma',
    'w kw hz rpm l ml cl j in inch inches deg pt pts pkt pct pcs szt newton newtons niuton niutony gram grams gramos',
    'newtones gramow grados stopni do ohm',
  ].flatMap((line) => line.split(' ')),
);
