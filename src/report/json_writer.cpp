#include "report/json_writer.hpp"

#include <cmath>
#include <cstddef>
#include <utility>

#include "rainledger/base/number.hpp"
#include "rainledger/base/printable.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kReplacement = "\xEF\xBF\xBD";  // U+FFFD

void append_escaped(std::string& out, char c) {
    constexpr std::string_view kDigits = "0123456789abcdef";
    switch (c) {
        case '"':
            out += "\\\"";
            return;
        case '\\':
            out += "\\\\";
            return;
        case '\n':
            out += "\\n";
            return;
        case '\t':
            out += "\\t";
            return;
        default:
            break;
    }
    const auto byte = static_cast<unsigned char>(c);
    if (byte >= 0x20U) {
        out += c;
        return;
    }
    out += "\\u00";
    out += kDigits[byte >> 4U];
    out += kDigits[byte & 0x0FU];
}

}  // namespace

void append_json_string(std::string& out, std::string_view text) {
    out += '"';
    for (std::size_t i = 0; i < text.size();) {
        const std::size_t length = utf8_length(text, i);
        if (length == 1)
            append_escaped(out, text[i]);
        else
            out += length > 0 ? text.substr(i, length) : kReplacement;
        i += length > 0 ? length : 1;
    }
    out += '"';
}

void JsonWriter::new_line() {
    out_ += '\n';
    out_.append(2 * has_members_.size(), ' ');
}

void JsonWriter::begin_value() {
    if (std::exchange(after_key_, false) || has_members_.empty()) return;
    if (has_members_.back()) out_ += ',';
    has_members_.back() = true;
    new_line();
}

void JsonWriter::raw(std::string_view text) {
    begin_value();
    out_ += text;
}

void JsonWriter::open(char bracket) {
    begin_value();
    out_ += bracket;
    has_members_.push_back(false);
}

void JsonWriter::close(char bracket) {
    const bool had_members = has_members_.back();
    has_members_.pop_back();
    if (had_members) new_line();
    out_ += bracket;
}

void JsonWriter::key(std::string_view name) {
    begin_value();
    append_json_string(out_, name);
    out_ += ": ";
    after_key_ = true;
}

void JsonWriter::value(std::string_view text) {
    begin_value();
    append_json_string(out_, text);
}

void JsonWriter::value(double number) {
    if (!std::isfinite(number)) {
        null();
        return;
    }
    begin_value();
    append_shortest(out_, number + 0.0);  // a negative zero loses its sign
}

std::string JsonWriter::take() && {
    out_ += '\n';
    return std::move(out_);
}

}  // namespace rainledger
