#include "rainledger/reference/provenance.hpp"

namespace rainledger {
namespace {

void append_part(std::string& out, std::string_view part) {
    if (part.empty()) return;
    out += ", ";
    out += part;
}

}  // namespace

std::string_view status_words(Status status) {
    switch (status) {
        case Status::confirmed:
            return "confirmed";
        case Status::from_memory:
            return "from memory";
        case Status::common_practice:
            break;
    }
    return "common practice";
}

std::string citation(const Provenance& provenance) {
    const Source& source = *provenance.source;
    std::string out(source.author);
    out += ": ";
    out += source.title;
    append_part(out, source.year);
    append_part(out, source.edition);
    append_part(out, provenance.place);
    out += " (";
    out += status_words(provenance.status);
    if (!provenance.remark.empty()) {
        out += "; ";
        out += provenance.remark;
    }
    return out + ")";
}

}  // namespace rainledger
