#include "rainledger/base/whole_file.hpp"

#include <algorithm>
#include <cerrno>
#include <cstdio>
#include <cstdlib>
#include <cstring>
#include <filesystem>
#include <system_error>
#include <utility>

#include <fcntl.h>
#include <sys/stat.h>
#include <unistd.h>

namespace rainledger {
namespace {

std::string last_error() {
    return std::system_category().message(errno);
}

/// Permissions for the finished file: those of the file it replaces, else what the umask leaves.
mode_t finished_mode(const std::string& target) {
    struct stat status {};
    if (::stat(target.c_str(), &status) == 0) return status.st_mode & 07777U;
    const mode_t mask = ::umask(0);
    ::umask(mask);
    return 0666U & ~mask;
}

}  // namespace

int write_all(int descriptor, std::string_view content) {
    while (!content.empty()) {
        const ssize_t written = ::write(descriptor, content.data(), content.size());
        if (written < 0 && errno == EINTR) continue;
        if (written < 0) return errno;
        content.remove_prefix(static_cast<std::size_t>(written));
    }
    return 0;
}

std::optional<std::string> read_whole_file(const std::string& path, std::string& problem) {
    const int descriptor = ::open(path.c_str(), O_RDONLY | O_CLOEXEC);
    if (descriptor < 0) {
        problem = last_error();
        return std::nullopt;
    }
    std::string content;
    struct stat status {};
    if (::fstat(descriptor, &status) == 0 && status.st_size > 0)
        content.reserve(static_cast<std::size_t>(status.st_size) + 1);
    constexpr std::size_t kChunk = std::size_t{1} << 20U;
    constexpr std::size_t kMostBytes = std::size_t{1} << 30U;  // an endless device must end
    std::size_t used = 0;
    while (true) {
        const std::size_t room = std::max(content.capacity() - used, std::size_t{1});
        content.resize(used + std::min(room, kChunk));
        const ssize_t got = ::read(descriptor, content.data() + used, content.size() - used);
        if (got < 0 && errno == EINTR) continue;
        if (got < 0) {
            problem = last_error();
            ::close(descriptor);
            return std::nullopt;
        }
        if (got == 0) break;
        used += static_cast<std::size_t>(got);
        if (used > kMostBytes) {
            problem = "it holds more than 1 GiB";
            ::close(descriptor);
            return std::nullopt;
        }
    }
    content.resize(used);
    ::close(descriptor);
    return content;
}

std::optional<WholeFile> WholeFile::open(const std::string& path, std::string& problem) {
    WholeFile file;
    file.path_ = path;
    file.target_ = path;
    std::error_code ignored;
    const std::filesystem::path resolved = std::filesystem::canonical(path, ignored);
    if (!ignored) {
        file.target_ = resolved.string();
    } else if (const auto aim = std::filesystem::read_symlink(path, ignored); !ignored) {
        // A link to what is not there yet: the file it names is made.
        file.target_ = (std::filesystem::path(path).parent_path() / aim).string();
    }

    struct stat status {};
    if (::stat(file.target_.c_str(), &status) == 0 && !S_ISREG(status.st_mode)) {
        file.descriptor_ = ::open(file.target_.c_str(), O_WRONLY | O_CLOEXEC);
        if (file.descriptor_ < 0) {
            problem = last_error();
            return std::nullopt;
        }
        return file;
    }
    std::string pattern = file.target_ + ".part-XXXXXX";
    file.descriptor_ = ::mkostemp(pattern.data(), O_CLOEXEC);
    if (file.descriptor_ < 0) {
        problem = last_error();
        return std::nullopt;
    }
    file.temporary_ = pattern;
    return file;
}

WholeFile::WholeFile(WholeFile&& other) noexcept
    : path_(std::move(other.path_)),
      target_(std::move(other.target_)),
      temporary_(std::exchange(other.temporary_, {})),
      descriptor_(std::exchange(other.descriptor_, -1)) {}

WholeFile& WholeFile::operator=(WholeFile&& other) noexcept {
    if (this != &other) {
        discard();
        path_ = std::move(other.path_);
        target_ = std::move(other.target_);
        temporary_ = std::exchange(other.temporary_, {});
        descriptor_ = std::exchange(other.descriptor_, -1);
    }
    return *this;
}

WholeFile::~WholeFile() {
    discard();
}

void WholeFile::discard() noexcept {
    if (descriptor_ >= 0) ::close(descriptor_);
    if (!temporary_.empty()) ::unlink(temporary_.c_str());
    descriptor_ = -1;
    temporary_.clear();
}

bool WholeFile::write(std::string_view content, std::string& problem) {
    const int error = write_all(descriptor_, content);
    if (error != 0) problem = std::system_category().message(error);
    return error == 0;
}

bool WholeFile::commit(std::string& problem) {
    const bool direct = temporary_.empty();
    if (!direct && ::fchmod(descriptor_, finished_mode(target_)) != 0) {
        problem = last_error();
        return false;
    }
    if (::close(std::exchange(descriptor_, -1)) != 0) {
        problem = last_error();
        return false;
    }
    if (direct) return true;
    if (std::rename(temporary_.c_str(), target_.c_str()) != 0) {
        problem = last_error();
        return false;
    }
    temporary_.clear();
    return true;
}

}  // namespace rainledger
