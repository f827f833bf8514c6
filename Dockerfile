FROM mcr.microsoft.com/dotnet/sdk:10.0 AS build
WORKDIR /source
COPY global.json Directory.Build.props Directory.Packages.props .editorconfig ./
COPY src/ src/
COPY data/ data/
COPY wwwroot/ wwwroot/
RUN dotnet restore src/GlassPair.Web --locked-mode
RUN dotnet publish src/GlassPair.Web --no-restore --configuration Release --output /app

FROM mcr.microsoft.com/dotnet/aspnet:10.0
WORKDIR /app
COPY --from=build /app ./
# A named volume takes its owner from here.
RUN install --directory --owner=$APP_UID --group=$APP_UID /var/lib/glasspair
ENV ASPNETCORE_HTTP_PORTS=8080 \
    GlassPair__Stock__ArchiveFolder=/var/lib/glasspair/stocks \
    GlassPair__Site__KeysFolder=/var/lib/glasspair/keys
USER $APP_UID
EXPOSE 8080
ENTRYPOINT ["dotnet", "GlassPair.Web.dll"]
