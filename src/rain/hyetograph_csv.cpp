#include "rainledger/rain/hyetograph_csv.hpp"

#include <algorithm>
#include <string_view>
#include <utility>

#include "rain/csv_header.hpp"
#include "rain/csv_opening.hpp"
#include "rain/csv_plain_rows.hpp"
#include "rain/csv_rows.hpp"
#include "rain/csv_steps.hpp"
#include "rain/csv_text.hpp"
#include "rain/hyetograph_checks.hpp"
#include "rain/hyetograph_reading.hpp"
#include "rainledger/rain/timestamp.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kSample = 65536;  // bytes

constexpr std::string_view kExample =
    "a file begins with a row such as 'end [min],depth [mm]', then one row per step";

/// The rows of a text judged by its first part, and some more; to set memory aside.
std::size_t likely_rows(std::string_view text) {
    const std::string_view sample = text.substr(0, kSample);
    const auto lines = static_cast<std::size_t>(std::count(sample.begin(), sample.end(), '\n'));
    if (sample.size() == text.size()) return lines + 1;
    return text.size() / sample.size() * lines / 4 * 5;
}

/// Reads one file from its first line to its hyetograph.
class HyetographReader {
public:
    HyetographReader(const SourceText& source, const CsvLayout& layout, RowsOf rows_of,
                     CsvProblems& problems)
        : source_(source),
          layout_(layout),
          rows_of_(rows_of),
          problems_(problems),
          lines_(source.text()) {}

    std::optional<Hyetograph> read();

private:
    bool open();
    std::optional<CsvSteps> read_rows();
    [[nodiscard]] Hyetograph build(CsvSteps steps);
    [[nodiscard]] StampedEdges stamped_edges(const CsvSteps& steps);

    const SourceText& source_;
    const CsvLayout& layout_;
    RowsOf rows_of_;
    CsvProblems& problems_;
    CsvLines lines_;
    CsvColumns columns_;
    std::optional<Zone> zone_;
    bool has_offset_ = false;
};

bool HyetographReader::open() {
    if (holds_nul(source_.text(), problems_)) return false;
    zone_ = find_zone(layout_, problems_);
    CsvLine header;
    if (!lines_.next(header)) {
        problems_.file_error("the file holds no rows", std::string(kExample));
        return false;
    }
    auto columns = read_csv_header(header, layout_, problems_);
    if (!columns) return false;
    columns_ = std::move(*columns);
    lines_.use_separator(columns_.separator);
    if (layout_.zone && !columns_.stamped)
        problems_.warning(columns_.line, columns_.first_time().place,
                          "elapsed times have no use for the scenario's zone:");
    return !problems_.any_error();
}

std::optional<CsvSteps> HyetographReader::read_rows() {
    CsvRowReader reader(columns_, layout_, zone_, problems_);
    CsvStepMaker maker(columns_, layout_, problems_, {rows_of_, likely_rows(source_.text())});
    if (problems_.any_error()) return std::nullopt;
    CsvLine line;
    CsvRow row;
    bool any_row = false;
    while (lines_.next(line) && !reader.header_lacks_unit()) {
        any_row = true;
        if (reader.read(line, row)) {
            maker.add(row);
            add_plain_rows(columns_, reader, lines_, maker);
        } else {
            maker.add_unread();
        }
    }
    if (!any_row)
        problems_.error(columns_.line, 1, "there are no rows below the header",
                        std::string(kExample));
    CsvSteps steps = maker.finish();
    if (problems_.any_error()) return std::nullopt;
    has_offset_ = zone_ || reader.saw_offsets();
    return steps;
}

StampedEdges HyetographReader::stamped_edges(const CsvSteps& steps) {
    StampedEdges edges;
    edges.unix_ms.reserve(steps.edges.size());
    for (const double edge : steps.edges)
        edges.unix_ms.push_back(static_cast<std::int64_t>(edge));
    edges.offset_minutes = steps.offset_minutes;
    edges.has_offset = has_offset_;
    if (zone_)
        for (std::size_t i = 0; i < edges.unix_ms.size(); ++i)
            edges.offset_minutes[i] = zone_->offset_minutes(edges.unix_ms[i]);
    return edges;
}

Hyetograph HyetographReader::build(CsvSteps steps) {
    Hyetograph rain =
        columns_.stamped
            ? make_hyetograph(stamped_edges(steps), std::move(steps.rain))
            : make_hyetograph(std::move(steps.edges), columns_.time_unit, std::move(steps.rain));
    if (columns_.kind == RainKind::intensity)
        for (std::size_t i = 0; i < rain.steps(); ++i)
            rain.depth_mm[i] *= rain.duration_h[i];
    for (const std::size_t step : steps.dry)
        rain.taken_as_dry_h += rain.duration_h[step];
    rain.dry_steps = steps.dry;
    check_steps(rain, steps, columns_, source_.text(), problems_);
    return rain;
}

std::optional<Hyetograph> HyetographReader::read() {
    if (!open()) return std::nullopt;
    auto steps = read_rows();
    if (!steps) return std::nullopt;
    Hyetograph rain = build(std::move(*steps));
    if (problems_.any_error()) return std::nullopt;
    return rain;
}

}  // namespace

std::optional<Hyetograph> read_hyetograph_rows(const std::string& name, std::string text,
                                               const CsvLayout& layout, RowsOf rows_of,
                                               Diagnostics& diagnostics) {
    const SourceText source(name, std::move(text));
    CsvProblems problems(source, diagnostics);
    auto rain = HyetographReader(source, layout, rows_of, problems).read();
    problems.close();
    return rain;
}

std::optional<Hyetograph> read_hyetograph_csv(const std::string& name, std::string text,
                                              const CsvLayout& layout, Diagnostics& diagnostics) {
    auto plain = without_mark(name, std::move(text), diagnostics);
    if (!plain) return std::nullopt;
    return read_hyetograph_rows(name, *std::move(plain), layout, RowsOf::storm, diagnostics);
}

bool is_known_zone(const std::string& zone) {
    return Zone::find(zone).has_value();
}

}  // namespace rainledger
