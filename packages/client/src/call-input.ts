import type {
  AnswerOf,
  BodyInput,
  Contract,
  FilePart,
  ParamsOf,
  QueryInput,
} from "@beadroll/domain/contract/contract";

/** A file to send. */
export interface SentFile {
  readonly name: string;
  readonly bytes: Blob;
}

/** The keys of `T` that must be given. */
type Demanded<T> = { [K in keyof T]-?: Record<never, never> extends Pick<T, K> ? never : K }[keyof T];

/** `Key` as a property: absent where there is nothing to give, optional where all of it may be left out. */
type Given<Key extends string, T> = [T] extends [undefined]
  ? { readonly [K in Key]?: never }
  : [Demanded<T>] extends [never]
    ? { readonly [K in Key]?: T }
    : { readonly [K in Key]: T };

type FilesFor<Parts> = {
  readonly [K in keyof Parts as Parts[K] extends { required: true } ? K : never]: SentFile;
} & { readonly [K in keyof Parts as Parts[K] extends { required: true } ? never : K]?: SentFile };

/** The file parts of an operation, as a caller gives them. */
type FilesOf<C extends Contract> = C extends {
  body: { kind: "multipart"; files: infer Parts extends Readonly<Record<string, FilePart>> };
}
  ? FilesFor<Parts>
  : undefined;

/** The version that was read must be named where the operation is guarded by it. */
type Seen<C extends Contract> = C extends { guard: "if-match" }
  ? { readonly seen_version: number }
  : { readonly seen_version?: never };

/** What a call carries: what its contract asks for, and nothing else. */
export type CallInput<C extends Contract> = Given<"params", ParamsOf<C>> &
  Given<"query", QueryInput<C>> &
  Given<"body", BodyInput<C>> &
  Given<"files", FilesOf<C>> &
  Seen<C> & {
    /** Makes a repeat of this call the same record; made up when absent. */
    readonly idempotency_key?: string;
    readonly signal?: AbortSignal;
  };

/** What a call gives: the answer of its contract, or bytes where the contract answers with a media type. */
export type CallAnswer<C extends Contract> = C["answer"] extends { media_type: string } ? Blob : AnswerOf<C>;

/** A call's input once the contract's types have done their work. */
export interface LooseInput {
  readonly params?: unknown;
  readonly query?: unknown;
  readonly body?: unknown;
  readonly files?: Readonly<Record<string, SentFile | undefined>>;
  readonly idempotency_key?: string;
  readonly seen_version?: number;
  readonly signal?: AbortSignal;
}
