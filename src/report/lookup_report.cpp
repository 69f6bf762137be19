#include "rainledger/report/lookup_report.hpp"

#include "rainledger/report/caution.hpp"
#include "rainledger/report/version.hpp"
#include "report/lookup_parts.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kHang = "    ";

std::string indented(std::string_view lines) {
    std::string out;
    while (!lines.empty()) {
        const std::size_t end = lines.find('\n') + 1;
        out.append(kFragmentIndent, ' ').append(lines.substr(0, end));
        lines.remove_prefix(end);
    }
    return out;
}

std::string section_text(const LookupSection& section, const Display& display) {
    std::string heading = section.heading;
    if (section.rows.size() == 1) heading += ": " + section.rows.front().name;
    std::string out = filled("", heading, kHang);
    if (!section.answer.empty()) out += filled("  Answer: ", section.answer, kHang);
    if (section.rows.size() == 1)
        out += row_text(section.rows.front(), display);
    else if (!section.rows.empty())
        out += table_text(section.rows, display);
    for (const std::string& line : section.lines)
        out += filled("  ", line, kHang);
    if (section.yaml.empty()) return out;
    return out + "\n  For a surface of a scenario:\n\n" + indented(section.yaml);
}

}  // namespace

std::string lookup_text(std::span<const LookupSection> sections, const SummaryOptions& options) {
    const Display display(options.units);
    std::string out;
    for (const LookupSection& section : sections)
        out += section_text(section, display) + "\n";
    return out + filled("", kLookupCaution, "") + "rainledger " + std::string(version()) + "\n";
}

std::vector<std::string> lookup_warnings(std::span<const LookupSection> sections) {
    const Display display(DisplayUnits::metric);
    std::vector<std::string> out;
    for (const LookupSection& section : sections) {
        if (section.yaml.empty()) continue;
        for (const RowView& row : section.rows)
            for (const ValueView& view : row.values)
                if (view.fault)
                    out.push_back(row.name + ": " + std::string(view.label) +
                                  " as printed: " + fault_words(view, display));
    }
    return out;
}

}  // namespace rainledger
