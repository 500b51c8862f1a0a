// Package lifetime holds the laws of process lifetime: how long a star lives.
package lifetime
