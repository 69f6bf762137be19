#include <cstddef>
#include <string>
#include <utility>

#include "rainledger/rain/hyetograph_csv.hpp"
#include "scenario/csv_layout_reader.hpp"
#include "scenario/input_file.hpp"
#include "scenario/storm_reader.hpp"

// Rain from a CSV file that the scenario names.
namespace rainledger {
namespace {

constexpr const char* kFileExample = "write a file name, such as 'hyetograph: rain.csv'";

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
                                          Storm& storm) {
    Entry named = entry;
    CsvLayout layout;
    const std::size_t errors_before = reading.diagnostics().error_count();
    if (entry.value.IsMap()) {
        const auto map =
            ClosedMap::read(reading, entry, "hyetograph", kHyetographKeys, kFileExample);
        layout = read_csv_layout(*map);
        layout.every_h = map->quantity("every", Dimension::time, Least::above_zero);
        const Entry* file = map->require("file", "rain.csv");
        if (file == nullptr) return std::nullopt;
        named = *file;
    }
    auto file = read_input_file(reading, named, "hyetograph: rain.csv");
    if (!file) return std::nullopt;
    storm.file = file->name;
    storm.files.push_back(file->path);
    if (reading.diagnostics().error_count() > errors_before) {
        read_rows_alone(file->path, std::move(file->text), layout, reading.diagnostics());
        return std::nullopt;
    }
    return read_hyetograph_csv(file->path, std::move(file->text), layout, reading.diagnostics());
}

}  // namespace rainledger
