export declare const builtInKernel: URL;
export declare function readBytes(url: URL, signal?: AbortSignal): Promise<Uint8Array>;
