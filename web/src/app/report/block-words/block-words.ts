import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { toProblemError } from '../../http/problem-error';
import { Notice } from '../../ui/notice/notice';
import { formatCount } from '../../ui/count';
import { CheckClient } from '../check-client';
import { meanWords } from './word-meanings';

/** The words of the block that was pointed at, letter by letter. */
@Component({
  selector: 'nl-block-words',
  imports: [Notice],
  templateUrl: './block-words.html',
  styleUrl: './block-words.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BlockWordsPanel {
  readonly #client = inject(CheckClient);

  readonly revisionId = input.required<string>();
  readonly line = input.required<number>();
  readonly closed = output();

  protected readonly block = rxResource({
    params: () => ({ revisionId: this.revisionId(), line: this.line() }),
    stream: ({ params }) => this.#client.words(params.revisionId, params.line),
  });
  protected readonly heading = computed(() => `Words of line ${formatCount(this.line())}`);
  protected readonly words = computed(() =>
    this.block.hasValue() ? meanWords(this.block.value()) : [],
  );
  protected readonly problem = computed(() => {
    const error = this.block.error();
    return error ? toProblemError(error) : null;
  });
}
