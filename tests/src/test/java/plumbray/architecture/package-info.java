/** Rules about which room may know which, held on the compiled classes. */
package plumbray.architecture;
