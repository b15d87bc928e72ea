// The framework answers this import itself: it fails the build when client code reaches it. There is no package to install.
declare module 'server-only'
