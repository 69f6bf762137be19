#include "scenario/depth_source_reader.hpp"

#include <string_view>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "scenario/input_file.hpp"

namespace rainledger {
namespace {

constexpr const char* kDepthsExample = "write 'depths: {5 min: 9.8 mm, 1 h: 41 mm}', rising";
constexpr const char* kFormulaExample =
    "write 'formula: {a: 96.6 in/h, b: 13.9, m: 0.97, n: 1, time: min}' for a / (t^m + b)^n";

/// One duration of a list with its depth, no shorter and no less than the one before.
bool read_listed_depth(const Reading& reading, const Entry& listed, DepthList& list) {
    const Entry key{"depths", listed.key_mark, YAML::Node(listed.key)};
    const Entry value{"depths, " + cut(listed.key), listed.key_mark, listed.value};
    const auto hours = read_quantity(reading, key, Dimension::time, Least::above_zero);
    const auto depth = read_quantity(reading, value, Dimension::depth, Least::above_zero);
    if (!hours || !depth) return false;
    const bool longer = list.duration_h.empty() || *hours > list.duration_h.back();
    const bool deeper = list.depth_mm.empty() || *depth >= list.depth_mm.back();
    if (!longer)
        reading.error(key.key_mark,
                      "depths: " + in_quotes(listed.key) + " is no longer than the duration before",
                      "list the durations from the shortest to the longest, each once");
    else if (!deeper)
        reading.error(value.mark(),
                      value.key + ": " + in_quotes(listed.value.Scalar()) +
                          " is less than in the shorter duration before",
                      "more time holds no less rain: check both depths and their units");
    if (!longer || !deeper) return false;
    list.duration_h.push_back(*hours);
    list.depth_mm.push_back(*depth);
    return true;
}

std::optional<DepthList> read_depth_list(const Reading& reading, const Entry& entry) {
    if (!is_map(reading, entry, "a map of durations to depths", kDepthsExample))
        return std::nullopt;
    DepthList list;
    bool sound = true;
    const std::vector<Entry> entries = entries_of(reading, entry, "depths");
    for (const Entry& listed : entries)
        sound = read_listed_depth(reading, listed, list) && sound;
    if (entry.value.size() == 0)
        reading.error(entry.mark(), "'depths' holds no entries", kDepthsExample);
    if (!sound || entries.size() != entry.value.size() || entries.empty()) return std::nullopt;
    return list;
}

/// An exponent: 1 unless given, above zero.
std::optional<double> read_exponent(const ClosedMap& map, std::string_view key) {
    const Entry* entry = map.find(key);
    if (entry == nullptr) return 1.0;
    const std::string hint = "write a plain number above zero, such as 0.97";
    const auto exponent = read_bare(map.reading(), *entry, hint);
    if (exponent && !(*exponent > 0.0)) {
        map.reading().error(
            entry->mark(), std::string(key) + ": '" + map.shown(key) + "' is not above zero", hint);
        return std::nullopt;
    }
    return exponent;
}

std::optional<double> read_formula_time(const ClosedMap& map) {
    if (map.require("time", "min") == nullptr) return std::nullopt;
    const auto time = map.word("time", kFormulaTimes);
    if (!time) return std::nullopt;
    return find_unit(kFormulaTimes[*time], Dimension::time)->to_canonical(1.0);
}

std::optional<IntensityFormula> read_formula(const Reading& reading, const Entry& entry) {
    const auto map = ClosedMap::read(reading, entry, "formula", kFormulaKeys, kFormulaExample);
    if (!map) return std::nullopt;
    const auto a = map->required_quantity("a", Dimension::rate, Least::above_zero);
    std::optional<double> b;
    if (const Entry* given = map->require("b", "13.9"))
        b = read_signed(reading, *given, "write a plain number, such as 13.9");
    const auto m = read_exponent(*map, "m");
    const auto n = read_exponent(*map, "n");
    const auto time_unit_h = read_formula_time(*map);
    if (!a || !b || !m || !n || !time_unit_h) return std::nullopt;
    return IntensityFormula{*a, *b, *m, *n, *time_unit_h};
}

std::optional<DepthSource> read_table(const Reading& reading, const Entry& entry, Storm& storm) {
    auto statistics = read_statistics(reading, entry);
    if (!statistics) return std::nullopt;
    storm.file = statistics->name;
    storm.files.push_back(statistics->path);
    return DepthSource{std::move(statistics->table), statistics->name};
}

}  // namespace

std::optional<StatisticsFile> read_statistics(const Reading& reading, const Entry& entry) {
    auto file = read_input_file(reading, entry, "statistics: county_rain.csv");
    if (!file) return std::nullopt;
    auto table =
        read_rainfall_statistics_csv(file->path, std::move(file->text), reading.diagnostics());
    if (!table) return std::nullopt;
    for (const std::string& left : table->set_aside)
        reading.diagnostics().warning(
            {file->path, 0, 0, {}}, left + " is left aside",
            "the first block that is not one of confidence limits is used");
    return StatisticsFile{*std::move(table), std::move(file->name), std::move(file->path)};
}

std::optional<DepthSource> read_depth_source(const Reading& reading, const Entry& entry,
                                             Storm& storm) {
    if (entry.key == "statistics") return read_table(reading, entry, storm);
    if (entry.key == "depth") {
        const auto depth = read_quantity(reading, entry, Dimension::depth, Least::above_zero);
        if (!depth) return std::nullopt;
        return DepthSource{*depth, "the stated depth"};
    }
    if (entry.key == "depths") {
        auto list = read_depth_list(reading, entry);
        if (!list) return std::nullopt;
        return DepthSource{DepthDuration{*std::move(list)}, "the listed depths"};
    }
    const auto formula = read_formula(reading, entry);
    if (!formula) return std::nullopt;
    return DepthSource{DepthDuration{*formula}, "the formula"};
}

}  // namespace rainledger
