import { type ClipboardEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { TextArea } from '../../../components/ui/TextArea.tsx';
import type { SettingAnswer } from '../answers.schema.ts';
import { readPastedSettings } from './paste-settings.ts';

interface Props {
  /** How many more settings there may be. */
  readonly room: number;
  readonly onAdd: (settings: SettingAnswer[]) => void;
}

/** Settings out of a spreadsheet, one a row. What was pasted stays until it could be read. */
export function PasteSettings({ room, onAdd }: Props) {
  const { t } = useTranslation('wizard');
  const [text, setText] = useState('');
  const [said, setSaid] = useState<{ error?: string; added?: string }>({});

  function add(pasted: string): void {
    const rows = readPastedSettings(pasted);
    if (rows.length === 0 || rows.length > room) {
      setSaid({
        error: rows.length === 0 ? t('settings.pasteNothing') : t('settings.pasteTooMany', { count: room }),
      });
      return;
    }
    onAdd(rows.map((row) => ({ ...row, id: crypto.randomUUID() })));
    setText('');
    setSaid({ added: t('settings.pasted', { count: rows.length }) });
  }
  function addAtOnce(event: ClipboardEvent): void {
    const pasted = event.clipboardData.getData('text');
    if (!pasted.includes('\t')) return;
    event.preventDefault();
    setText(pasted);
    add(pasted);
  }

  return (
    <Disclosure summary={t('settings.paste')}>
      <div className="grid gap-4">
        <TextArea
          id="paste-settings"
          label={t('settings.pasteLabel')}
          help={t('settings.pasteHelp')}
          value={text}
          error={said.error}
          onChange={(event) => setText(event.currentTarget.value)}
          onPaste={addAtOnce}
        />
        <div className="button-row items-center">
          <Button disabled={text.trim() === ''} onClick={() => add(text)}>
            {t('settings.pasteAdd')}
          </Button>
          <span role="status">{said.added}</span>
        </div>
      </div>
    </Disclosure>
  );
}
