/** Results of ours beside those of independent implementations. */
package plumbray.crosscheck;
