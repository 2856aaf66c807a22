/**
 * What one craft can send to one antenna: link budget, rates, and what is left of a rate after
 * frames and planning margin. Knows nothing of time, plans or where anything is: elevation, range
 * and off-pointing are given. Open {@link quietspan.link.Link} first.
 */
package quietspan.link;
