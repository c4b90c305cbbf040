export declare const builtInKernel: URL;
export declare const planetsSeries: URL;
export declare const moonSeries: URL;
export declare function readBytes(url: URL, signal?: AbortSignal): Promise<Uint8Array>;
