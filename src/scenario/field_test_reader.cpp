#include <algorithm>
#include <string_view>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/whole_file.hpp"
#include "rainledger/scenario/field_test_file.hpp"
#include "scenario/file_parts.hpp"
#include "scenario/input_file.hpp"
#include "scenario/list_reader.hpp"
#include "scenario/plain_text.hpp"
#include "scenario/yaml.hpp"
#include "scenario/yaml_document.hpp"

namespace rainledger {
namespace {

constexpr const char* kRingExample =
    "write 'ring: {inner_diameter: 300 mm, outer_diameter: 600 mm}', or the inner one alone";
constexpr const char* kLawsExample = "write 'laws: [horton, green_ampt]', or take the key out";
constexpr const char* kSteadyExample =
    "write 'steady_rate: {use: fitted}', '{fixed: 32 mm/h}' or '{from: tail}'";

/// A diameter, large enough for its area to be computed with.
std::optional<double> read_diameter(const ClosedMap& ring, std::string_view key) {
    constexpr double kSmallest_mm = 1.0;
    const auto diameter = ring.quantity(key, Dimension::depth, Least::above_zero);
    if (diameter && *diameter < kSmallest_mm)
        ring.reading().error(ring.mark_of(key),
                             std::string(key) + ": '" + ring.shown(key) + "' is under 1 mm",
                             "check the number and its unit");
    return diameter;
}

std::optional<RingDiameters> read_ring(const ClosedMap& test) {
    constexpr double kLargestRing_mm = 3000.0;
    const Entry* entry = test.find("ring");
    if (entry == nullptr) return std::nullopt;
    const auto map = ClosedMap::read(test.reading(), *entry, "ring", kRingKeys, kRingExample);
    if (!map) return std::nullopt;
    if (map->require("inner_diameter", "300 mm") == nullptr) return std::nullopt;
    const auto inner = read_diameter(*map, "inner_diameter");
    const auto outer = read_diameter(*map, "outer_diameter");
    if (inner && outer && !(*outer > *inner))
        map->reading().error(map->mark_of("outer_diameter"),
                             "outer_diameter: '" + map->shown("outer_diameter") +
                                 "' is not above the inner one, '" + map->shown("inner_diameter") +
                                 "'",
                             "a single ring has an inner_diameter alone");
    map->warn_above("inner_diameter", inner, kLargestRing_mm, "3 m", "check the unit");
    if (!inner) return std::nullopt;
    return RingDiameters{*inner, outer};
}

/// One law of the list; `told` holds those before it.
std::optional<std::string> read_law(const Reading& reading, const Entry& entry,
                                    std::vector<std::string>& told) {
    const auto law = read_word(reading, entry, kFittedLaws);
    if (!law) return std::nullopt;
    std::string name(kFittedLaws[*law]);
    if (std::ranges::find(told, name) != told.end()) {
        reading.error(entry.mark(), entry.key + ": '" + name + "' stands in the list before",
                      "name each law once");
        return std::nullopt;
    }
    told.push_back(name);
    return name;
}

std::vector<std::string> read_laws(const ClosedMap& test) {
    const Entry* entry = test.find("laws");
    if (entry == nullptr) return {};
    std::vector<std::string> told;
    return read_list<std::string>(
               test.reading(), *entry, kLawsExample,
               [&](const Entry& law) { return read_law(test.reading(), law, told); })
        .value_or(std::vector<std::string>());
}

/// A key that takes one word alone.
void read_only_word(const ClosedMap& map, const Entry& entry, std::string_view word) {
    const auto text = read_text(map.reading(), entry, kSteadyExample);
    if (text && *text != word)
        map.reading().error(entry.mark(),
                            entry.key + ": " + in_quotes(*text) + " is not a choice here",
                            kSteadyExample);
}

void read_steady_rate(const ClosedMap& test, FieldTestFile& file) {
    const Entry* entry = test.find("steady_rate");
    if (entry == nullptr) return;
    const auto map =
        ClosedMap::read(test.reading(), *entry, "steady_rate", kSteadyRateKeys, kSteadyExample);
    if (!map) return;
    const Entry* only = map->exactly_one(kSteadyRateKeys, "steady_rate says nothing",
                                         kSteadyExample, kSteadyExample);
    if (only == nullptr) return;
    if (only->key == "use") read_only_word(*map, *only, kFitted);
    if (only->key == "from") {
        file.steady = SteadyWish::tail;
        read_only_word(*map, *only, kTail);
    }
    if (only->key == "fixed") {
        file.steady = SteadyWish::fixed;
        file.fixed_rate_mm_per_h =
            read_quantity(map->reading(), *only, Dimension::rate, Least::zero).value_or(0.0);
    }
}

double read_design_factor(const ClosedMap& test) {
    constexpr double kLargeFactor = 20.0;
    const std::string hint = "it divides every rate: write 1 or more, such as 2";
    const Entry* entry = test.find("design_factor");
    if (entry == nullptr) return 1.0;
    const auto factor = read_bare(test.reading(), *entry, hint);
    if (factor && !(*factor >= 1.0))
        test.reading().error(
            entry->mark(), "design_factor: '" + test.shown("design_factor") + "' is below 1", hint);
    test.warn_above("design_factor", factor, kLargeFactor, "20", "factors of 2 to 10 are common");
    return factor.value_or(1.0);
}

void read_readings(const ClosedMap& test, FieldTestFile& file) {
    const std::string example = "readings: pit3.csv";
    const Entry* entry = test.require("readings", "pit3.csv");
    if (entry == nullptr) return;
    auto input = read_input_file(test.reading(), *entry, example);
    if (!input) return;
    file.readings = std::move(input->name);
    file.readings_path = std::move(input->path);
    file.readings_text = std::move(input->text);
}

std::optional<FieldTestFile> read_parts(const std::string& name, std::string text,
                                        Diagnostics& diagnostics) {
    strip_byte_order_mark(text);
    const Reading reading(name, std::move(text), diagnostics, kFieldTestFile);
    const auto document = read_document(reading);
    if (!document || refuse_other_kind(reading, *document)) return std::nullopt;
    const Entry root{"field test", document->Mark(), *document};
    const auto map = ClosedMap::read(reading, root, "the field test", kFieldTestKeys,
                                     std::string(kFieldTestFile.example));
    if (!map) return std::nullopt;
    FieldTestFile file;
    file.title = read_title(*map);
    read_readings(*map, file);
    file.ring = read_ring(*map);
    file.laws = read_laws(*map);
    read_steady_rate(*map, file);
    file.ignore_first_h = map->quantity("ignore_first", Dimension::time).value_or(0.0);
    if (map->has("ignore_first")) file.ignore_first = reading.at(map->mark_of("ignore_first"));
    file.design_factor = read_design_factor(*map);
    if (diagnostics.has_errors()) return std::nullopt;
    return file;
}

}  // namespace

std::optional<FieldTestFile> read_field_test_file(const std::string& path,
                                                  Diagnostics& diagnostics) {
    std::string problem;
    auto text = read_whole_file(path, problem);
    if (!text) {
        diagnostics.unreadable({path, 0, 0, {}}, "cannot read the field test: " + problem);
        return std::nullopt;
    }
    return read_field_test_text(path, *std::move(text), diagnostics);
}

std::optional<FieldTestFile> read_field_test_text(const std::string& name, std::string text,
                                                  Diagnostics& diagnostics) {
    Diagnostics found;
    auto file = read_parts(name, std::move(text), found);
    hand_over(found, name, diagnostics);
    return file;
}

}  // namespace rainledger
