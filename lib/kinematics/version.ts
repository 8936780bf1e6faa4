/** Part of every map's key: raise it whenever a change of the kernel can change a stored answer. */
export const KERNEL_VERSION = 5;
