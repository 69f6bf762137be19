#include <filesystem>
#include <string>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/unit_spellings.hpp"
#include "rainledger/base/whole_file.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"
#include "scenario/storm_reader.hpp"

// Rain from a CSV file that the scenario names.
namespace rainledger {
namespace {

constexpr std::size_t kLongestPath = 400;  // characters shown
constexpr const char* kFileExample = "write a file name, such as 'hyetograph: rain.csv'";

/// A file name relative to the scenario's folder, as messages show it.
std::string path_beside(const std::string& scenario, const std::string& file) {
    return (std::filesystem::path(scenario).parent_path() / file).string();
}

/// A unit of one of the dimensions, kept as text for the CSV reader.
std::optional<std::string> read_unit(const ClosedMap& map, std::string_view key,
                                     std::initializer_list<Dimension> dimensions,
                                     const std::string& hint) {
    const auto name = map.text(key, hint);
    if (!name) return std::nullopt;
    for (const Dimension dimension : dimensions)
        if (find_unit(*name, dimension)) return name;
    std::optional<std::string> meant;
    for (const Dimension dimension : dimensions)
        if (!meant) meant = meant_unit(*name, dimension);
    map.reading().error(map.mark_of(key),
                        std::string(key) + ": " + in_quotes(*name) + " is not a unit here",
                        meant ? "did you mean '" + *meant + "'?" : hint);
    return std::nullopt;
}

/// Whether the unit and the kind of the rain column speak of the same thing.
void check_unit_and_kind(const ClosedMap& map, const CsvLayout& layout) {
    if (!layout.rain_unit || !layout.kind) return;
    const bool rate = find_unit(*layout.rain_unit, Dimension::rate).has_value();
    const bool intensity = *layout.kind == RainKind::intensity;
    if (rate == intensity) return;
    map.reading().error(map.mark_of("unit"),
                        "unit: " + in_quotes(*layout.rain_unit) +
                            " does not go with 'kind: " + map.shown("kind") + "'",
                        intensity ? "an intensity takes a unit such as 'mm/h'"
                                  : "a depth takes a unit such as 'mm'");
}

void read_zone(const ClosedMap& map, CsvLayout& layout) {
    const std::string hint = "write a zone by its place, such as 'Europe/Madrid'";
    const auto zone = map.text("zone", hint);
    if (!zone) return;
    if (is_known_zone(*zone))
        layout.zone = zone;
    else
        map.reading().error(map.mark_of("zone"),
                            "zone: " + in_quotes(*zone) + " is not in the time zone database",
                            hint);
}

/// The meanings of the columns. For a wrong word, which is reported, one that can stand in its
/// place lets the rows be looked at.
void read_kind_and_stamp(const ClosedMap& map, CsvLayout& layout) {
    if (const auto kind = map.word("kind", kRainKinds))
        layout.kind = static_cast<RainKind>(*kind);
    else if (map.has("kind") && layout.rain_unit)
        layout.kind =
            find_unit(*layout.rain_unit, Dimension::rate) ? RainKind::intensity : RainKind::depth;
    if (const auto stamp = map.word("stamp", kStamps))
        layout.stamp = static_cast<StampMeaning>(*stamp);
    else if (map.has("stamp"))
        layout.stamp = StampMeaning::end;
}

CsvLayout read_layout(const ClosedMap& map) {
    CsvLayout layout;
    layout.time_column = map.text("time", "write the header of the time column");
    layout.rain_column = map.text("rain", "write the header of the rain column");
    layout.rain_unit = read_unit(map, "unit", {Dimension::depth, Dimension::rate},
                                 "write a unit such as 'mm', 'in', 'mm/h' or 'in/h'");
    layout.time_unit =
        read_unit(map, "time_unit", {Dimension::time}, "write a unit such as 's', 'min' or 'h'");
    read_kind_and_stamp(map, layout);
    layout.every_h = map.quantity("every", Dimension::time, Least::above_zero);
    read_zone(map, layout);
    layout.gaps_are_dry = map.word("gaps", kGaps).has_value();
    layout.missing = map.text("missing", "write the text that marks a missing value, such as -999");
    check_unit_and_kind(map, layout);
    return layout;
}

/// The line of the header: the first that is neither blank nor a comment.
std::size_t header_line(std::string_view text) {
    std::size_t line = 1;
    while (!text.empty() && (text[0] == '#' || text[0] == '\n' || text[0] == '\r')) {
        const std::size_t newline = text.find('\n');
        if (newline == std::string_view::npos) break;
        text.remove_prefix(newline + 1);
        ++line;
    }
    return line;
}

/// Reads a file whose layout is wrong. What its header is then said to lack may follow from that
/// alone, so only the problems of its rows are handed on.
void read_rows_alone(const std::string& path, std::string text, const CsvLayout& layout,
                     Diagnostics& diagnostics) {
    const std::size_t header = header_line(text);
    Diagnostics found;
    // Nothing is computed from it.
    static_cast<void>(read_hyetograph_csv(path, std::move(text), layout, found));
    for (const Diagnostic& each : found.list())
        if (each.place.line > header && each.severity == Severity::error)
            diagnostics.error(each.place, each.message, each.hint);
}

}  // namespace

std::optional<Hyetograph> read_hyetograph(const Reading& reading, const Entry& entry,
                                          std::string& file_name) {
    Entry file = entry;
    CsvLayout layout;
    const std::size_t errors_before = reading.diagnostics().error_count();
    if (entry.value.IsMap()) {
        const auto map =
            ClosedMap::read(reading, entry, "hyetograph", kHyetographKeys, kFileExample);
        layout = read_layout(*map);
        const Entry* named = map->require("file", "rain.csv");
        if (named == nullptr) return std::nullopt;
        file = *named;
    }
    const auto name = read_text(reading, file, kFileExample);
    if (!name) return std::nullopt;
    if (name->empty()) {
        reading.error(file.mark(), "the file name is empty", kFileExample);
        return std::nullopt;
    }
    file_name = *name;
    const std::string path = path_beside(reading.name(), *name);
    std::string problem;
    auto text = read_whole_file(path, problem);
    if (!text) {
        reading.diagnostics().unreadable(
            reading.at(file.mark()), "cannot read '" + cut(path, kLongestPath) + "': " + problem,
            "file names are relative to the scenario's folder");
        return std::nullopt;
    }
    if (reading.diagnostics().error_count() > errors_before) {
        read_rows_alone(path, std::move(*text), layout, reading.diagnostics());
        return std::nullopt;
    }
    return read_hyetograph_csv(path, std::move(*text), layout, reading.diagnostics());
}

}  // namespace rainledger
