#pragma once

#include <optional>
#include <string>
#include <vector>

#include "rainledger/base/diagnostic.hpp"

// The YAML of a field test: where its readings are, and how they are to be fitted. Plain values;
// what is computed from them lives in the room of field tests.
namespace rainledger {

/// The rings of an infiltrometer, as written.
struct RingDiameters {
    double inner_mm = 0.0;
    std::optional<double> outer_mm;  ///< none: a single ring
};

/// Where the steady rate of the fit comes from, as written under `steady_rate`.
enum class SteadyWish { fitted, fixed, tail };

struct FieldTestFile {
    std::string title;
    std::string readings;       ///< the CSV as named
    std::string readings_path;  ///< as opened
    std::string readings_text;  ///< what it holds
    std::optional<RingDiameters> ring;
    std::vector<std::string> laws;  ///< keys of laws in their order; empty: all
    SteadyWish steady = SteadyWish::fitted;
    double fixed_rate_mm_per_h = 0.0;  ///< for SteadyWish::fixed
    double ignore_first_h = 0.0;
    Place ignore_first;  ///< where that stands, for messages that only the fit can give; line 0
                         ///< where it does not
    double design_factor = 1.0;
};

/// Reads the YAML of a field test (interface of `rainledger fit`):
///
///   title: Quarry Row, pit 3
///   readings: pit3.csv
///   ring: {inner_diameter: 300 mm, outer_diameter: 600 mm}
///   laws: [horton, green_ampt, philip, kostiakov, modified_kostiakov]
///   steady_rate: {use: fitted}        # or {fixed: 32 mm/h}, or {from: tail}
///   ignore_first: 0 min
///   design_factor: 2
///
/// Every problem is added to `diagnostics`; nothing is returned if any is an error.
[[nodiscard]] std::optional<FieldTestFile> read_field_test_file(const std::string& path,
                                                                Diagnostics& diagnostics);

/// The same from text that is already in memory; `name` stands for the file in messages and gives
/// the folder for the readings.
[[nodiscard]] std::optional<FieldTestFile> read_field_test_text(const std::string& name,
                                                                std::string text,
                                                                Diagnostics& diagnostics);

/// The JSON Schema (draft 2020-12) of the YAML of field tests, as text ending in a newline.
[[nodiscard]] std::string field_test_schema();

}  // namespace rainledger
