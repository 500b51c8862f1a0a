// Package encounter holds the laws of how objects meet, and what comes of it.
package encounter
