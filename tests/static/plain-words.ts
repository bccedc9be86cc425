import type { Language } from '../../src/i18n/languages.ts';
import { isPlain } from './sentences.ts';

/**
 * The field's standard terms (ISO 3534-3 and common textbook words) as each language writes them, by their beginnings. They belong on the engineer's
 * pages; whoever runs a machine reads their plain words. Words that people use in other senses too, such as an answer for a response, are left out.
 */
const auditTerms: Record<Language, RegExp> = {
  en: /\b(factors?\b|response variable|levels?\b|replicat|interaction|curvature|alias|confound|cent(er|re) points?|variance|standard deviation|(?<!loud )noise|outlier|regression|coefficient|significan|p-value|hypothes|factorial|randomi[sz]|orthogonal|residual|degrees? of freedom|confidence interval|blocking)/i,
  es: /(?<!\p{L})(factor(es)?(?!\p{L})|variable de respuesta|réplica|interacci|curvatura|alias|confundid|punto central|puntos centrales|varianza|desviación (estándar|típica)|atípic|regresi|coeficiente|significativ|hipótesis|factorial|aleatori|ortogonal|residuo|grados? de libertad|intervalo de confianza)/iu,
  pl: /(?<!\p{L})(czynnik|zmienna odpowiedzi|replik|interakcj|krzywizn|alias|uwikła|punkt(y|ów)? centraln|warianc|odchyleni\p{L}* standardow|odstając|regresj|współczynnik|istotn\p{L}* statystyczn|hipotez|randomiz|ortogonal|rezydu|stopn\p{L}* swobody|przedzia\p{L}* ufności)/iu,
  vi: /(nhân tố|biến đáp ứng|tương tác|độ cong(?! vênh)|điểm tâm|phương sai|độ lệch chuẩn|ngoại lai|hồi quy|hệ số|ý nghĩa thống kê|giả thuyết|ngẫu nhiên hóa|trực giao|phần dư|bậc tự do|khoảng tin cậy)/iu,
};

/** Every text of a supervisor or an operator with a term of the engineer's pages in it. */
export function findAuditTerms(language: Language, words: ReadonlyMap<string, string>): string[] {
  return [...words].flatMap(([key, text]) => {
    const [found] = isPlain(key) ? (auditTerms[language].exec(text) ?? []) : [];
    return found === undefined ? [] : [`${key}: "${found}" in "${text}"`];
  });
}
