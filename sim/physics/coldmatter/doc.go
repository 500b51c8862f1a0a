// Package coldmatter is what becomes of cold matter whose nucleons never decay:
// fusion by zero-point motion alone, the turning of all elements to iron, and
// the tunnelling of whole bodies into holes.
//
// Masses are in solar masses, densities in g/cm3. Times are log10 of years;
// they run from 10^20 to 10^(10^77) yr, and 10^L is never formed.
//
// Left out: whatever else might happen in that time. The exponents themselves
// are uncertain by a factor of a few, those of tunnelling by more.
package coldmatter
