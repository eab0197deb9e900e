package plumbray.raymodel.profile;

/** One additive piece of a temperature profile; a family is a sum of these. */
interface ProfileTerm {

  /** How many parameters the term has. */
  int count();

  /**
   * Adds f, f', f'' to {@code out[0..2]} and writes df/dk, df'/dk for its parameters from {@code
   * out[at]} on.
   *
   * @param z height above the ground, m, 0 to 50
   */
  void add(double z, double[] out, int at);

  /** See {@link TemperatureProfile#verticalScaleM}. */
  double scaleM(double z);
}
