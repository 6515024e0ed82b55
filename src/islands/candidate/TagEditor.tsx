import { useId, useRef, useState, type SubmitEvent } from 'react';
import { asApiError, requestJson, type ApiError } from '../api';
import { Button } from '../Button';
import { ErrorNote } from '../ErrorNote';
import { addTag, longestTag, removeTag } from './tags';

export interface TagEditorProps {
  catalystId: string;
  code: string;
  tags: readonly string[];
  mayTag: boolean;
}

/** A candidate's tags; a change shows at once and is taken back when it could not be saved. */
export function TagEditor({ catalystId, code, tags: given, mayTag }: TagEditorProps) {
  const [tags, setTags] = useState([...given]);
  const [typed, setTyped] = useState('');
  const [saving, setSaving] = useState(false);
  const [notice, setNotice] = useState('');
  const [undo, setUndo] = useState<string[] | null>(null);
  const [error, setError] = useState<ApiError | null>(null);
  const input = useRef<HTMLInputElement>(null);
  const inputId = useId();

  const save = async (next: string[], words: string, before: string[] | null) => {
    const previous = tags;
    setTags(next);
    setSaving(true);
    setError(null);
    setNotice(words);
    setUndo(before);
    try {
      await requestJson(`/api/v1/candidates/${encodeURIComponent(catalystId)}/tags`, {
        method: 'PUT',
        json: { tags: next },
      });
    } catch (thrown) {
      setTags(previous);
      setNotice('');
      setUndo(null);
      setError(asApiError(thrown));
    } finally {
      setSaving(false);
    }
  };

  const submit = (event: SubmitEvent) => {
    event.preventDefault();
    const change = addTag(tags, typed);
    if ('refusal' in change) {
      setNotice(change.refusal);
      setUndo(null);
      return;
    }
    setTyped('');
    void save(change.tags, `Added “${change.tags.at(-1) ?? ''}”.`, null);
  };

  return (
    <section aria-label={`Tags of ${code}`}>
      <h2 className="text-quiet mb-1 text-[13px] font-normal">Tags</h2>
      {tags.length === 0 && <p className="text-quiet text-[13.5px]">None yet.</p>}
      <ul className="m-0 flex list-none flex-wrap gap-1.5 p-0">
        {tags.map((tag) => (
          <li
            key={tag}
            className="border-rule flex min-h-7 items-center rounded-[3px] border pl-2 text-[13.5px]"
          >
            <span className="max-w-56 truncate pr-2" title={tag}>
              {tag}
            </span>
            {mayTag && (
              <button
                type="button"
                disabled={saving}
                aria-label={`Remove tag ${tag}`}
                className="text-quiet hover:text-refusal focus-visible:outline-accent size-7 cursor-pointer focus-visible:outline-2 disabled:opacity-50"
                onClick={() => {
                  input.current?.focus();
                  void save(removeTag(tags, tag), `Removed “${tag}”.`, tags);
                }}
              >
                ×
              </button>
            )}
          </li>
        ))}
      </ul>
      {mayTag && (
        <form onSubmit={submit} className="mt-2 flex gap-2">
          <label htmlFor={inputId} className="sr-only">
            New tag
          </label>
          <input
            id={inputId}
            ref={input}
            value={typed}
            maxLength={longestTag + 10}
            placeholder="New tag"
            autoComplete="off"
            onChange={(event) => setTyped(event.target.value)}
            className="border-rule bg-sheet focus-visible:outline-accent min-h-9 w-full min-w-0 rounded-[3px] border px-2 focus-visible:outline-2"
          />
          <Button type="submit" disabled={saving}>
            Add
          </Button>
        </form>
      )}
      <p aria-live="polite" className="text-quiet mt-1 min-h-5 text-[13px]">
        {notice}{' '}
        {undo && !saving && (
          <Button kind="text" onClick={() => void save(undo, 'Put back.', null)}>
            Undo
          </Button>
        )}
      </p>
      {error && <ErrorNote error={error} />}
    </section>
  );
}
