package plumbray.imaging.reading;

/**
 * The row in which the ground cuts off an inverted image, as found in the picture. The ray there
 * just clears the ground and so has felt the air next to it, which no other ray has.
 *
 * @param image number of the image that ends there, counted downwards
 * @param row row, px
 */
public record GroundEdge(int image, double row) {}
