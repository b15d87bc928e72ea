// @peculiar/x509 resolves its parts through reflected metadata, which must be there before it is loaded.
import 'reflect-metadata'

export * as x509 from '@peculiar/x509'
