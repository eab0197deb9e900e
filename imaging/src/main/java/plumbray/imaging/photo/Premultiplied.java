package plumbray.imaging.photo;

/** Undoes the multiplication of light by alpha that some files come with. */
final class Premultiplied {
  private Premultiplied() {}

  /** Light divided by alpha, rounded to nearest; what is wholly transparent stays as it is. */
  static Photo undone(Photo premultiplied) {
    PhotoShape shape = premultiplied.shape();
    PhotoBuilder builder = new PhotoBuilder(shape).metadata(premultiplied.metadata());
    float[] row = new float[shape.rowSamples()];
    int alphaChannel = shape.channels() - 1;
    for (int y = 0; y < shape.heightPx(); y++) {
      premultiplied.row(y, row);
      for (int pixel = 0; pixel < row.length; pixel += shape.channels()) {
        float alpha = row[pixel + alphaChannel];
        for (int c = 0; c < alphaChannel && alpha > 0; c++) {
          row[pixel + c] = row[pixel + c] * shape.highestSample() / alpha;
        }
      }
      builder.row(y, row);
    }
    return builder.build();
  }
}
