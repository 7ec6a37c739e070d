package nightjar.storage;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import ucar.ma2.DataType;
import ucar.nc2.Dimension;
import ucar.nc2.Variable;

/** The library's description of a netCDF-4 file in our words. */
final class Hdf5Description {
  private static final int LONGEST_ATTRIBUTE = 1 << 17;

  private Hdf5Description() {}

  /** A variable; one of variable length is given a type that nothing reads. */
  static StoredVariable variable(Variable v) {
    List<StoredDimension> dimensions = new ArrayList<>();
    ValueType type = type(v.getDataType());
    for (Dimension d : v.getDimensions()) {
      String name = d.getShortName();
      dimensions.add(new StoredDimension(name == null ? "" : name, Math.max(0, d.getLength())));
      type = d.isVariableLength() ? ValueType.OTHER : type;
    }
    Map<String, Attribute> attributes = attributes(v.getAttributes());
    if (v.isUnsigned()) {
      attributes.put("_Unsigned", Attribute.text("true"));
    }
    return new StoredVariable(v.getShortName(), type, dimensions, attributes);
  }

  /** Attributes by name; those that are neither text nor numbers are left out. */
  static Map<String, Attribute> attributes(List<ucar.nc2.Attribute> attributes) {
    Map<String, Attribute> ours = new LinkedHashMap<>();
    for (ucar.nc2.Attribute a : attributes) {
      if (a.getLength() == 0 || a.getLength() > LONGEST_ATTRIBUTE) {
        continue;
      }
      if (a.isString()) {
        ours.put(a.getShortName(), Attribute.text(joined(a)));
      } else if (type(a.getDataType()).isNumber()) {
        ours.put(a.getShortName(), Attribute.numbers(type(a.getDataType()), numbers(a)));
      }
    }
    return ours;
  }

  private static String joined(ucar.nc2.Attribute a) {
    StringBuilder s = new StringBuilder();
    for (int i = 0; i < a.getLength(); i++) {
      s.append(i == 0 ? "" : " ").append(a.getStringValue(i));
    }
    return s.toString();
  }

  private static double[] numbers(ucar.nc2.Attribute a) {
    double[] numbers = new double[a.getLength()];
    for (int i = 0; i < numbers.length; i++) {
      Number n = a.getNumericValue(i);
      numbers[i] = n == null ? Double.NaN : n.doubleValue();
    }
    return numbers;
  }

  private static ValueType type(DataType type) {
    return switch (type) {
      case BYTE -> ValueType.BYTE;
      case CHAR -> ValueType.CHAR;
      case SHORT -> ValueType.SHORT;
      case INT -> ValueType.INT;
      case LONG -> ValueType.LONG;
      case FLOAT -> ValueType.FLOAT;
      case DOUBLE -> ValueType.DOUBLE;
      default -> ValueType.OTHER;
    };
  }
}
